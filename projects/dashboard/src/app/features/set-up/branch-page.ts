import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { getCosts } from '#shared/contracts/set-up';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatExactMoney } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { branchChange, rateChange } from '../../ui/set-up/branch-changes';
import { ChangeForm } from '../../ui/set-up/change-form';
import { DatedCosts } from '../../ui/set-up/dated-costs';
import { BranchKeys } from './branch-keys';
import { WhoChanged } from './who-changed';

/** One branch: its facts, what an hour costs there by date, and the push keys of its own system. */
@Component({
  selector: 'us-branch-page',
  imports: [BranchKeys, ChangeForm, DatedCosts, LoadState, RouterLink, WhoChanged],
  templateUrl: './branch-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchPage {
  /** From the address. */
  readonly code = input.required<string>();

  private readonly api = inject(Api);
  protected readonly catalogue = inject(Catalogue);
  protected readonly costs = this.api.read(getCosts, () => ({}));
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly branch = computed(() =>
    this.catalogue.branches().find(({ code }) => code === this.code()),
  );
  protected readonly form = computed(() => {
    const branch = this.branch();
    const surroundings = { regions: this.catalogue.regions(), taken: [] };
    return branch && branchChange(this.api, surroundings, branch);
  });
  /** The first cost counts from the branch's opening, so that no car before it is without one. */
  protected readonly rateForm = computed(() => {
    const first = this.rates().length === 0 ? this.branch()?.openedOn : undefined;
    return rateChange(this.api, this.code(), first ?? this.today());
  });
  protected readonly rates = computed(() =>
    (this.costs.value()?.rates ?? [])
      .filter(({ branch }) => branch === this.code())
      .map(({ from, hourlyCostCents }) => ({
        from,
        text: formatExactMoney(hourlyCostCents, this.catalogue.currency()),
      })),
  );
}
