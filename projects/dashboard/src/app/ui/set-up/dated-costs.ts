import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Column } from '../data-table/column';
import { DataTable } from '../data-table/data-table';
import { formatShortDate } from '../format';

/** A cost or rate with the day it is valid from; `null`: from the start. */
export interface DatedCost {
  readonly from: string | null;
  readonly text: string;
}

/** Costs by the day they are valid from, newest first, today's marked. */
@Component({
  selector: 'us-dated-costs',
  imports: [DataTable],
  template: `
    @if (rows().length > 0) {
      <us-data-table [label]="label()" [columns]="columns()" [rows]="ordered()" />
    } @else {
      <p class="us-small us-quiet">{{ none() }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
      max-width: 420px;
      margin-bottom: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DatedCosts {
  readonly label = input.required<string>();
  /** What the cost is of: "An hour". */
  readonly heading = input.required<string>();
  readonly rows = input.required<readonly DatedCost[]>();
  readonly today = input.required<string>();
  /** What it means that there is none yet. */
  readonly none = input.required<string>();

  protected readonly ordered = computed(() =>
    [...this.rows()].sort((a, b) => (b.from ?? '').localeCompare(a.from ?? '')),
  );
  private readonly current = computed(() => costOfDay(this.rows(), this.today()));
  protected readonly columns = computed((): Column<DatedCost>[] => [
    {
      key: 'from',
      label: 'From',
      text: (row) => (row.from === null ? 'the start' : formatShortDate(row.from)),
      quiet: (row) =>
        row === this.current() ? 'now' : (row.from ?? '') > this.today() ? 'to come' : undefined,
    },
    { key: 'cost', label: this.heading(), kind: 'number', text: (row) => row.text },
  ]);
}

/** The one valid on a day: the newest that had begun by then. */
export function costOfDay<Row extends { readonly from: string | null }>(
  rows: readonly Row[],
  day: string,
): Row | undefined {
  return rows
    .filter(({ from }) => from === null || from <= day)
    .reduce<Row | undefined>(
      (newest, row) => ((row.from ?? '') >= (newest?.from ?? '') ? row : newest),
      undefined,
    );
}
