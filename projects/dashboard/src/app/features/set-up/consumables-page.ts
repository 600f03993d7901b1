import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import type { OutOf } from '#shared/contracts/endpoint';
import { getCosts } from '#shared/contracts/set-up';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatExactMoney, formatShortDate } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { costOfDay } from '../../ui/set-up/dated-costs';
import { consumableCostChange } from '../../ui/set-up/product-changes';
import { CONSUMABLE_NAMES } from '../../ui/words';
import { WhoChanged } from './who-changed';

type Row = OutOf<typeof getCosts>['consumables'][number];

/** What counted things cost by date, where a job names no price of its own. */
@Component({
  selector: 'us-consumables-page',
  imports: [ChangeForm, DataTable, LoadState, WhoChanged],
  templateUrl: './consumables-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConsumablesPage {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  protected readonly costs = this.api.read(getCosts, () => ({}));
  private readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly form = computed(() => consumableCostChange(this.api, this.today()));
  /** By kind, the newest first. */
  protected readonly rows = computed(() =>
    [...(this.costs.value()?.consumables ?? [])].sort(
      (a, b) => a.kind.localeCompare(b.kind) || b.from.localeCompare(a.from),
    ),
  );
  protected readonly columns = computed((): Column<Row>[] => [
    {
      key: 'kind',
      label: 'Consumable',
      text: ({ kind }) => CONSUMABLE_NAMES[kind],
      strong: (row) => this.standing(row) === 'now',
    },
    {
      key: 'from',
      label: 'From',
      text: ({ from }) => formatShortDate(from),
      quiet: (row) => this.standing(row),
    },
    {
      key: 'cost',
      label: 'One costs',
      kind: 'number',
      text: ({ unitCostCents }) => formatExactMoney(unitCostCents, this.catalogue.currency()),
    },
  ]);

  private standing(row: Row): string | undefined {
    if (row.from > this.today()) return 'to come';
    const same = this.rows().filter(({ kind }) => kind === row.kind);
    return costOfDay(same, this.today()) === row ? 'now' : undefined;
  }
}
