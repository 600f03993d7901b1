import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { getCosts } from '#shared/contracts/set-up';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatExactMoney, formatShortDate } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { type Branch, branchChange } from '../../ui/set-up/branch-changes';
import { ChangeForm } from '../../ui/set-up/change-form';
import { costOfDay } from '../../ui/set-up/dated-costs';
import { WhoChanged } from './who-changed';

/** The branches, and the way to a new one. */
@Component({
  selector: 'us-branches-page',
  imports: [ChangeForm, DataTable, LoadState, RouterLink, WhoChanged],
  templateUrl: './branches-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchesPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly catalogue = inject(Catalogue);
  private readonly costs = this.api.read(getCosts, () => ({}));
  protected readonly columns = computed((): Column<Branch>[] => [
    {
      key: 'name',
      label: 'Branch',
      text: ({ name }) => name,
      quiet: ({ code }) => code,
      link: ({ code }) => ({ commands: ['/set-up/branches', code] }),
      sortBy: ({ name }) => name,
    },
    {
      key: 'region',
      label: 'Region',
      text: ({ region }) => this.catalogue.regionName(region),
      sortBy: ({ region }) => this.catalogue.regionName(region),
    },
    {
      key: 'open',
      label: 'Open',
      text: ({ openedOn, closedOn }) =>
        closedOn
          ? `${formatShortDate(openedOn)} to ${formatShortDate(closedOn)}`
          : `since ${formatShortDate(openedOn)}`,
      sortBy: ({ openedOn }) => openedOn,
    },
    {
      key: 'hour',
      label: 'An hour costs',
      kind: 'number',
      text: ({ code }) => {
        const cents = this.hourlyCost(code);
        return cents === undefined
          ? 'not known'
          : formatExactMoney(cents, this.catalogue.currency());
      },
      muted: ({ code }) => this.hourlyCost(code) === undefined,
      sortBy: ({ code }) => this.hourlyCost(code) ?? null,
    },
  ]);
  protected readonly form = computed(() =>
    branchChange(this.api, {
      regions: this.catalogue.regions(),
      taken: this.catalogue.branches().map(({ code }) => code),
    }),
  );

  /** On to the new branch's own page, where its hourly cost is asked for. */
  protected async added({ code }: Branch): Promise<void> {
    this.catalogue.state.reload();
    await this.router.navigate(['/set-up/branches', code]);
  }

  private hourlyCost(code: string): number | undefined {
    const rates = (this.costs.value()?.rates ?? []).filter(({ branch }) => branch === code);
    return costOfDay(rates, this.catalogue.today() ?? '')?.hourlyCostCents;
  }
}
