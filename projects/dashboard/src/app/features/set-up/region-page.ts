import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { Corrosivity } from '../../ui/set-up/corrosivity';
import { regionChange } from '../../ui/set-up/region-changes';
import { typedClimate } from './typed-climate';
import { WhoChanged } from './who-changed';

/** One region: its name and its air. */
@Component({
  selector: 'us-region-page',
  imports: [ChangeForm, Corrosivity, LoadState, RouterLink, WhoChanged],
  templateUrl: './region-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RegionPage {
  /** From the address. */
  readonly code = input.required<string>();

  private readonly api = inject(Api);
  protected readonly catalogue = inject(Catalogue);
  protected readonly typed = typedClimate();
  protected readonly region = computed(() =>
    this.catalogue.regions().find(({ code }) => code === this.code()),
  );
  protected readonly branches = computed(() =>
    this.catalogue.branches().filter(({ region }) => region === this.code()),
  );
  protected readonly form = computed(() => {
    const region = this.region();
    return region && regionChange(this.api, [], region);
  });
}
