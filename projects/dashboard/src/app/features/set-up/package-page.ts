import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { BODY_TYPES } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { NormForms } from '../../ui/set-up/norm-forms';
import { packageChange } from '../../ui/set-up/package-changes';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { Removal } from './removal';
import { WhoChanged } from './who-changed';

/** One package: name, warranty, and the product expected on each body type. */
@Component({
  selector: 'us-package-page',
  imports: [ChangeForm, LoadState, NormForms, Removal, RouterLink, WhoChanged],
  templateUrl: './package-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PackagePage {
  /** From the address. */
  readonly code = input.required<string>();
  /** The body type whose norm is open, from the address. */
  readonly body = input<string>();

  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly catalogue = inject(Catalogue);
  protected readonly sold = computed(() =>
    this.catalogue.packages().find(({ code }) => code === this.code()),
  );
  protected readonly form = computed(() => {
    const sold = this.sold();
    return sold && packageChange(this.api, [], sold);
  });
  protected readonly bodies = BODY_TYPES.map((type) => ({ type, name: BODY_TYPE_NAMES[type] }));
  protected readonly bodyType = computed(
    () => BODY_TYPES.find((type) => type === this.body()) ?? 'hatchback',
  );

  protected async leave(): Promise<void> {
    this.catalogue.state.reload();
    await this.router.navigate(['/set-up/packages']);
  }
}
