import type { ImportedFile, PreviewRow } from '#shared/contracts/imports';
import type { Column } from '../../ui/data-table/column';
import { formatCount } from '../../ui/format';

/** What a row would do, in a word. */
export const STATUS_NAMES: Readonly<Record<PreviewRow['status'], string>> = {
  new: 'new',
  changed: 'changed',
  unchanged: 'unchanged',
  refused: 'refused',
};

const LONGEST_CELL = 40;

const LINE: Column<PreviewRow> = {
  key: 'line',
  label: 'Line',
  kind: 'number',
  text: (row) => formatCount(row.line),
};

/** Columns of the first rows: what each row would do, then its cells under the file's own headings, left-out ones not. */
export function previewColumns(file: Pick<ImportedFile, 'columns'>): Column<PreviewRow>[] {
  return [
    LINE,
    { key: 'status', label: 'Would be', text: (row) => STATUS_NAMES[row.status] },
    ...file.columns
      .filter((column) => column.field !== null)
      .map((column): Column<PreviewRow> => ({
        key: `column-${column.index}`,
        label: column.heading || `Column ${column.index + 1}`,
        text: (row) => shortened(row.values[column.index] ?? ''),
      })),
  ];
}

/** Columns of the refused rows: which, and every reason under its heading. */
export const REFUSED_COLUMNS: readonly Column<PreviewRow>[] = [
  LINE,
  { key: 'ref', label: 'Reference', text: (row) => row.ref ?? 'none' },
  { key: 'why', label: 'Why', text: reasons },
];

/** A long note must not push the other cells out of sight. */
function shortened(value: string): string {
  return value.length > LONGEST_CELL ? `${value.slice(0, LONGEST_CELL - 1)}…` : value;
}

/** Every reason of a row: `Completed on: is not a day; Make: must not be empty`. */
export function reasons(row: PreviewRow): string {
  return row.problems
    .map(({ heading, message }) => (heading === null ? message : `${heading}: ${message}`))
    .join('; ');
}
