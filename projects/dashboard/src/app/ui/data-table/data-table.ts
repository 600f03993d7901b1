import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  contentChildren,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatSortModule, type Sort } from '@angular/material/sort';
import { MatTableModule } from '@angular/material/table';
import { RouterLink } from '@angular/router';
import { ScrollRegion } from '../scroll-region/scroll-region';
import { type BarGeometry, barGeometry } from './bar-geometry';
import { CellTemplate } from './cell-template';
import type { Column } from './column';
import { sortRows, type TableSort } from './sort-rows';

/** Rows behind an answer: sortable, hairlines between, numbers right, a total row where columns name one. */
@Component({
  selector: 'us-data-table',
  imports: [MatSortModule, MatTableModule, NgTemplateOutlet, RouterLink, ScrollRegion],
  templateUrl: './data-table.html',
  styleUrl: './data-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DataTable<Row> {
  /** What the table shows, for those who hear it. */
  readonly label = input.required<string>();
  readonly columns = input.required<readonly Column<Row>[]>();
  readonly rows = input.required<readonly Row[]>();
  /** The order at first. */
  readonly sort = input<TableSort>();
  /** `server`: rows come sorted, `sorted` says what was asked for. */
  readonly sortedBy = input<'here' | 'server'>('here');
  readonly chosen = input<(row: Row) => boolean>();
  readonly sorted = output<TableSort | undefined>();

  private readonly templates = contentChildren(CellTemplate);
  protected readonly active = linkedSignal(() => this.sort());
  protected readonly keys = computed(() => this.columns().map((column) => column.key));
  protected readonly hasTotal = computed(() =>
    this.columns().some((column) => column.total !== undefined),
  );
  protected readonly shown = computed(() =>
    this.sortedBy() === 'here' ? sortRows(this.rows(), this.columns(), this.active()) : this.rows(),
  );
  private readonly reach = computed(() => {
    const most: Record<string, { low: number; high: number }> = {};
    for (const column of this.columns()) {
      if (!column.bar) continue;
      const values = this.rows().map((row) => column.bar?.(row) ?? 0);
      most[column.key] = { low: Math.min(0, ...values), high: Math.max(0, ...values) };
    }
    return most;
  });

  /** A row that says the same in a newer answer stays as it is, with the focus that may be in it. */
  protected readonly same = (_: number, row: Row): unknown => JSON.stringify(row);

  protected change(sort: Sort): void {
    const next: TableSort | undefined = sort.direction
      ? { key: sort.active, direction: sort.direction }
      : undefined;
    this.active.set(next);
    this.sorted.emit(next);
  }

  protected templateOf(key: string): CellTemplate['template'] | undefined {
    return this.templates().find((cell) => cell.usCell() === key)?.template;
  }

  protected isStrong(column: Column<Row>, row: Row): boolean {
    return typeof column.strong === 'function' ? column.strong(row) : column.strong === true;
  }

  protected barOf(column: Column<Row>, row: Row): BarGeometry | undefined {
    const value = column.bar?.(row);
    const reach = this.reach()[column.key];
    return value === null || value === undefined || !reach ? undefined : barGeometry(value, reach);
  }
}
