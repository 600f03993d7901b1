import { stringify } from 'csv-stringify/sync';
import { defused } from '#shared/domain/defused';

/** RFC 4180 text with CRLF, no BOM, `.` decimals and empty cells for null (rule 62). */
const FORMAT = {
  record_delimiter: '\r\n',
  // The library quotes a whole line end only; half of one would break a row as well.
  quoted_match: /[\r\n]/,
  cast: {
    boolean: (value: boolean) => String(value),
    number: (value: number) => String(value),
    string: defused,
  },
} as const;

/** The header row. */
export function csvHeader(columns: readonly string[]): string {
  return stringify([[...columns]], FORMAT);
}

/** The rows of some records under the given columns. */
export function csvRows(columns: readonly string[], records: readonly object[]): string {
  const paths = columns.map((column) => column.split('.'));
  return stringify(
    records.map((record) => paths.map((path) => valueAt(record, path))),
    FORMAT,
  );
}

function valueAt(record: object, path: readonly string[]): unknown {
  let value: unknown = record;
  for (const part of path) {
    if (typeof value !== 'object' || value === null) return null;
    value = (value as Record<string, unknown>)[part];
  }
  return value ?? null;
}
