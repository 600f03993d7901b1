import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { Column } from '../../ui/data-table/column';
import { formatExactAmount, formatNumber } from '../../ui/format';
import { halfYearWords } from './warranty-words';

/** A line of the paid triangle, or of what is worked out below it. */
export interface TriangleRow {
  readonly key: string;
  readonly name: string;
  readonly cells: readonly string[];
  /** Cohorts stand plain, what is worked out from them strong. */
  readonly kind: 'cohort' | 'sum';
}

/** The triangle as a table, with its factors and their sums, exact to the cent so that it can be redone by hand. */
export interface TriangleTable {
  readonly columns: readonly Column<TriangleRow>[];
  readonly rows: readonly TriangleRow[];
}

/** Turns the triangle into rows. Pure. */
export function triangleTable({ triangle, cohorts }: WarrantyAnswer): TriangleTable {
  const { rows, factors } = triangle;
  const width = Math.max(0, ...rows.map(({ cumulativeCents }) => cumulativeCents.length));
  const ultimate = new Map(cohorts.map(({ cohort, ultimateCents }) => [cohort, ultimateCents]));
  const worked = (
    key: string,
    name: string,
    cell: (development: number) => string,
  ): TriangleRow => ({
    ...{ key, name, kind: 'sum' },
    // The sums of a factor stand under the half-year it leads to.
    cells: Array.from({ length: width }, (_, to) => (to === 0 ? '' : cell(to - 1))),
  });
  const factorOf = (development: number) => factors.find((one) => one.development === development);
  return {
    rows: [
      ...rows.map(({ cohort, cumulativeCents }): TriangleRow => ({
        key: cohort,
        name: halfYearWords(cohort),
        cells: [
          ...Array.from({ length: width }, (_, index) => {
            const cents = cumulativeCents[index];
            return cents === undefined ? '' : formatExactAmount(cents);
          }),
          formatExactAmount(ultimate.get(cohort) ?? 0),
        ],
        kind: 'cohort',
      })),
      worked('to', 'sum up to here', (from) => amount(factorOf(from)?.toCents)),
      worked('from', 'the same cars, one half-year before', (from) =>
        amount(factorOf(from)?.fromCents),
      ),
      worked('factor', 'factor', (from) => number(factorOf(from)?.factor, 6)),
      worked('sigma', 'sigma squared', (from) => number(factorOf(from)?.sigmaSquared, 2)),
    ],
    columns: [
      {
        key: 'name',
        label: 'Finished in',
        text: ({ name }) => name,
        strong: ({ kind }) => kind === 'sum',
      },
      ...Array.from({ length: width }, (_, index): Column<TriangleRow> => ({
        key: `development-${index}`,
        label: index === 0 ? 'that half-year' : `+${index}`,
        kind: 'number',
        text: ({ cells }) => cells[index] ?? '',
      })),
      {
        key: 'ultimate',
        label: 'in all, expected',
        kind: 'number',
        text: ({ cells }) => cells[width] ?? '',
      },
    ],
  };
}

function amount(cents: number | undefined): string {
  return cents === undefined ? '' : formatExactAmount(cents);
}

function number(value: number | null | undefined, decimals: number): string {
  if (value === undefined) return '';
  return value === null ? 'not defined' : formatNumber(value, decimals);
}
