import type { Column } from '../../ui/data-table/column';
import { formatCount } from '../../ui/format';
import type { ProcessRow } from './process-rows';

/** Cars and claims of one way of working in one age band. */
export interface StratumRow {
  readonly key: string;
  readonly missed: string;
  readonly ageBand: string;
  readonly exposedCars: number;
  readonly exposedClaims: number;
  readonly unexposedCars: number;
  readonly unexposedClaims: number;
}

/** The fourfold tables that the ratios are pooled from, one line each. */
export function strataRows(rows: readonly ProcessRow[]): StratumRow[] {
  return rows.flatMap(({ key, missed, tables }) =>
    tables.map((table) => ({ ...table, key: `${key}/${table.ageBand}`, missed })),
  );
}

/** Columns of these lines. */
export const STRATA_COLUMNS: readonly Column<StratumRow>[] = [
  { key: 'missed', label: 'What was missed', text: ({ missed }) => missed },
  { key: 'age', label: 'Age, years', text: ({ ageBand }) => ageBand.replace('-', '–') },
  number('exposedCars', 'Cars where missed'),
  number('exposedClaims', 'with a claim'),
  number('unexposedCars', 'Cars where done'),
  number('unexposedClaims', 'with a claim'),
];

function number(
  key: 'exposedCars' | 'exposedClaims' | 'unexposedCars' | 'unexposedClaims',
  label: string,
): Column<StratumRow> {
  return { key, label, kind: 'number', text: (row) => formatCount(row[key]) };
}
