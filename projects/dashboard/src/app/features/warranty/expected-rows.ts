import type { ExpectedRate, WarrantyAnswer } from '#shared/contracts/warranty';
import type { Column } from '../../ui/data-table/column';
import { formatCount, formatNumber } from '../../ui/format';
import { groupName, type WarrantyWords } from './warranty-words';

/** The rates that an expectation is made of, so that it can be redone by hand. */
export interface ExpectedTable {
  readonly columns: readonly Column<ExpectedRate>[];
  readonly rows: readonly ExpectedRate[];
}

/** Turns the rates into rows: claims and car-years of the reference, car-years of the answer's own rows, and what they lead to. */
export function expectedTable(
  { expectedRates }: WarrantyAnswer,
  words: WarrantyWords,
): ExpectedTable {
  return {
    rows: expectedRates,
    columns: [
      { key: 'package', label: 'Package', text: (rate) => words.packageWord(rate.package) },
      { key: 'age', label: 'Age', text: ({ ageBand }) => groupName('ageBand', ageBand, words) },
      {
        key: 'year',
        label: 'Year of cover',
        kind: 'number',
        text: ({ yearInService }) => formatCount(yearInService),
      },
      {
        key: 'claims',
        label: 'Claims',
        kind: 'number',
        text: ({ claims }) => (claims === null ? 'not told' : formatCount(claims)),
        muted: ({ claims }) => claims === null,
      },
      {
        key: 'years',
        label: 'Car-years',
        kind: 'number',
        text: ({ carYears }) => (carYears === null ? '' : formatNumber(carYears, 2)),
      },
      {
        key: 'own',
        label: 'Car-years of the rows',
        kind: 'number',
        text: ({ ownCarYears }) => formatNumber(ownCarYears, 2),
      },
      {
        key: 'expected',
        label: 'Expected',
        kind: 'number',
        text: ({ claims, carYears, ownCarYears }) =>
          claims === null || !carYears ? '' : formatNumber((claims / carYears) * ownCarYears, 2),
      },
    ],
  };
}
