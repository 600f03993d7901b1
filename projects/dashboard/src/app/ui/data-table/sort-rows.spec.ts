import type { Column } from './column';
import { sortRows } from './sort-rows';

interface Row {
  readonly name: string;
  readonly kept: number | null;
}
const ROWS: readonly Row[] = [
  { name: '10', kept: 5 },
  { name: '9', kept: null },
  { name: '11', kept: -3 },
];
const COLUMNS: readonly Column<Row>[] = [
  { key: 'name', label: 'Name', text: (row) => row.name, sortBy: (row) => row.name },
  { key: 'kept', label: 'Kept', text: (row) => String(row.kept), sortBy: (row) => row.kept },
];
const names = (rows: readonly Row[]) => rows.map((row) => row.name);

describe('sortRows', () => {
  it('without an order leaves the rows as they came', () => {
    expect(sortRows(ROWS, COLUMNS, undefined)).toBe(ROWS);
  });

  it('either way keeps rows without a value last', () => {
    expect(names(sortRows(ROWS, COLUMNS, { key: 'kept', direction: 'asc' }))).toEqual([
      '11',
      '10',
      '9',
    ]);
    expect(names(sortRows(ROWS, COLUMNS, { key: 'kept', direction: 'desc' }))).toEqual([
      '10',
      '11',
      '9',
    ]);
  });

  it('of words that hold numbers counts them', () => {
    expect(names(sortRows(ROWS, COLUMNS, { key: 'name', direction: 'asc' }))).toEqual([
      '9',
      '10',
      '11',
    ]);
  });
});
