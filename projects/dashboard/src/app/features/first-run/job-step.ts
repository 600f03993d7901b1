import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ScrollRegion } from '../../ui/scroll-region/scroll-region';
import { keyChange } from '../../ui/set-up/branch-changes';
import { ChangeForm } from '../../ui/set-up/change-form';
import { NewKey } from '../../ui/set-up/new-key';
import { curlExample } from './curl-example';
import { KnownNetwork } from './known-network';

/** The three ways of a first job: the form, a file, the branch's own system. */
@Component({
  selector: 'us-job-step',
  imports: [ChangeForm, MatButton, NewKey, RouterLink, ScrollRegion],
  templateUrl: './job-step.html',
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobStep {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  private readonly origin = inject(DOCUMENT).location.origin;
  protected readonly known = inject(KnownNetwork);
  protected readonly branch = computed(() => this.catalogue.branches()[0]);
  protected readonly key = signal<string | undefined>(undefined);
  protected readonly keyForm = computed(() => keyChange(this.api, this.branch()?.code ?? ''));
  protected readonly curl = computed(() => {
    const branch = this.branch();
    const sold = this.catalogue.packages()[0];
    const day = this.catalogue.today();
    if (!branch || !sold || day === undefined) return undefined;
    const product = this.catalogue.value()?.products[0]?.code;
    return curlExample({ origin: this.origin, branch: branch.code, sold: sold.code, product, day });
  });
}
