import type { Params } from '@angular/router';
import type { ProductUse } from '#shared/contracts/products';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCars, formatCount, formatExactAmount } from '../../ui/format';
import { BODY_TYPE_NAMES } from '../../ui/words';
import type { Cars } from './cars-of-use';
import { presentShare, type ProductWords } from './product-words';

/** Leads to the cars of a row. */
export type UseLink = (row: ProductUse, cars: Cars) => CellLink | undefined;

/** Columns of one product's rows against the norm. */
export function useColumns(
  words: ProductWords,
  currencySign: string,
  linkOf: UseLink,
): readonly Column<ProductUse>[] {
  return [
    ...kindColumns(words, linkOf),
    millilitres('norm', 'Norm, ml', ({ normMl }) => normMl),
    millilitres('mean', 'Mean', ({ meanMl }) => meanMl),
    ...spreadColumns(),
    outside('under', 'Under 70 %', linkOf),
    withoutAny(),
    outside('over', 'Over 130 %', linkOf),
    costColumn(currencySign),
  ];
}

/** Columns of rows without a norm, in ml. */
export function normlessColumns(
  words: ProductWords,
  currencySign: string,
  linkOf: UseLink,
): readonly Column<ProductUse>[] {
  return [
    ...kindColumns(words, linkOf),
    millilitres('mean', 'Mean, ml', ({ meanMl }) => meanMl),
    ...spreadColumns(),
    costColumn(currencySign),
  ];
}

/** Where a row's cars are listed. */
export function jobsLink(query: Params): CellLink {
  return { commands: ['/jobs'], query };
}

function kindColumns(words: ProductWords, linkOf: UseLink): Column<ProductUse>[] {
  const kind = (row: ProductUse): string =>
    `${words.packageWord(row.package)} ${BODY_TYPE_NAMES[row.bodyType]}`;
  return [
    { key: 'kind', label: 'Kind of car', text: kind, sortBy: kind },
    {
      key: 'cars',
      label: 'Cars',
      kind: 'number',
      text: ({ cars }) => formatCount(cars),
      link: (row) => linkOf(row, 'all'),
      sortBy: ({ cars }) => cars,
    },
  ];
}

function spreadColumns(): Column<ProductUse>[] {
  return [
    {
      key: 'median',
      label: 'Half got at least',
      kind: 'number',
      strong: ({ medianMl }) => medianMl !== null,
      text: ({ medianMl }) => (medianMl === null ? 'too few cars yet' : formatCount(medianMl)),
      muted: ({ medianMl }) => medianMl === null,
      sortBy: ({ medianMl }) => medianMl,
    },
    {
      key: 'most',
      label: '8 of 10 between',
      kind: 'number',
      text: ({ p10Ml, p90Ml }) =>
        p10Ml === null || p90Ml === null ? '' : `${formatCount(p10Ml)}–${formatCount(p90Ml)}`,
    },
  ];
}

function outside(key: 'under' | 'over', label: string, linkOf: UseLink): Column<ProductUse> {
  const shareOf = (row: ProductUse): number | null =>
    key === 'under' ? row.underShare : row.overShare;
  return {
    key,
    label,
    kind: 'number',
    // Below 5 cars the count stays, the share does not (rule 13).
    text: (row) => {
      const share = shareOf(row);
      return share === null ? formatCars(row[key] ?? 0) : presentShare(share);
    },
    muted: (row) => shareOf(row) === null,
    link: (row) => (row[key] ? linkOf(row, key) : undefined),
    sortBy: shareOf,
  };
}

/** The gravest of those under: cars that got none at all. */
function withoutAny(): Column<ProductUse> {
  const none = ({ cars, carsListing }: ProductUse): number => cars - carsListing;
  return {
    key: 'none',
    label: 'Got none',
    kind: 'number',
    text: (row) => formatCount(none(row)),
    muted: (row) => none(row) === 0,
    sortBy: none,
  };
}

function millilitres(
  key: string,
  label: string,
  value: (row: ProductUse) => number | null,
): Column<ProductUse> {
  return {
    key,
    label,
    kind: 'number',
    text: (row) => {
      const ml = value(row);
      return ml === null ? '' : formatCount(ml);
    },
    sortBy: value,
  };
}

function costColumn(currencySign: string): Column<ProductUse> {
  return {
    key: 'cost',
    label: `${currencySign} a car`,
    kind: 'number',
    text: ({ costPerCarCents }) =>
      costPerCarCents === null ? '' : formatExactAmount(costPerCarCents),
    sortBy: ({ costPerCarCents }) => costPerCarCents,
  };
}
