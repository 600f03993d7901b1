import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import type { RotModel } from '#shared/contracts/rot';
import { ShareCell } from '../../charts/share-cell/share-cell';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { sortRows, type TableSort } from '../../ui/data-table/sort-rows';
import { formatCount, formatShare } from '../../ui/format';
import { narrowWindow } from '../../ui/narrow';
import { FIRST_MODELS, type ModelsView, narrowOrder, shareCell } from './rot-models';

const FIRST_SORT: TableSort = { key: 'steadied', direction: 'desc' };

/** Models of one age, as counted and steadied, the first few until all are asked for. Sorts all of them, not only those shown. */
@Component({
  selector: 'us-models-table',
  imports: [CellTemplate, DataTable, ShareCell],
  template: `
    <p class="key us-small us-quiet" aria-hidden="true">
      <span
        ><svg width="14" height="12"><path class="counted" d="M7 1l5 5l-5 5l-5 -5z" /></svg>as
        counted</span
      >
      <span
        ><svg width="10" height="12"><circle class="steadied" cx="5" cy="6" r="4.5" /></svg>steadied
        toward all models</span
      >
      @if (all(); as share) {
        <span
          ><svg width="3" height="18"><line class="all" x1="1.5" x2="1.5" y1="0" y2="18" /></svg>all
          models, {{ share }}</span
        >
      }
    </p>
    @if (view().pooled; as pooled) {
      <p class="us-small">{{ pooled }}</p>
    }
    <us-data-table
      sortedBy="server"
      [label]="view().heading"
      [columns]="columns()"
      [rows]="shown()"
      [sort]="first"
      (sorted)="sort.set($event)"
    >
      <ng-template usCell="picture" let-row>
        <us-share-cell [data]="cell(row)" [end]="view().end" />
      </ng-template>
    </us-data-table>
    @if (hidden() > 0) {
      <button type="button" class="us-action us-unprinted" (click)="extent.set('all')">
        Show all {{ count(view().rows.length) }} models
      </button>
    }
  `,
  styleUrl: './models-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ModelsTable {
  readonly view = input.required<ModelsView>();

  private readonly narrow = narrowWindow();
  protected readonly first = FIRST_SORT;
  protected readonly columns = computed(() =>
    this.narrow() ? narrowOrder(this.view().columns) : this.view().columns,
  );
  protected readonly count = formatCount;
  protected readonly sort = signal<TableSort | undefined>(FIRST_SORT);
  /** Another age begins short again. */
  protected readonly extent = linkedSignal<string, 'first' | 'all'>({
    // By what the table is about: a newer answer to the same question folds nothing up.
    source: () => this.view().heading,
    computation: () => 'first',
  });
  private readonly sorted = computed(() =>
    sortRows(this.view().rows, this.view().columns, this.sort()),
  );
  protected readonly shown = computed(() =>
    this.extent() === 'all' ? this.sorted() : this.sorted().slice(0, FIRST_MODELS),
  );
  protected readonly hidden = computed(() => this.sorted().length - this.shown().length);
  protected readonly all = computed(() => {
    const { all } = this.view();
    return all === null ? null : formatShare(all);
  });

  protected cell(model: RotModel) {
    return shareCell(model, this.view().all);
  }
}
