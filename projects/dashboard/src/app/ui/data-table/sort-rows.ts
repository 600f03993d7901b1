import type { Column } from './column';

/** What a table is sorted by. */
export interface TableSort {
  readonly key: string;
  readonly direction: 'asc' | 'desc';
}

const words = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

/** The rows in the order asked for; rows without a value last, equal ones as they came. */
export function sortRows<Row>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  sort: TableSort | undefined,
): readonly Row[] {
  const sortBy = columns.find((column) => column.key === sort?.key)?.sortBy;
  if (!sort || !sortBy) return rows;
  const way = sort.direction === 'asc' ? 1 : -1;
  return [...rows].sort((a, b) => {
    const left = sortBy(a);
    const right = sortBy(b);
    if (left === null || right === null) return Number(left === null) - Number(right === null);
    return way * compare(left, right);
  });
}

function compare(left: number | string, right: number | string): number {
  return typeof left === 'number' && typeof right === 'number'
    ? left - right
    : words.compare(String(left), String(right));
}
