import type { ProductNeed, ProductNeedAnswer } from '#shared/contracts/products';
import {
  currencySign,
  formatAmount,
  formatCars,
  formatCount,
  formatDateRange,
  formatList,
  formatMoney,
} from '../../ui/format';
import type { Column } from '../../ui/data-table/column';
import { litres, litresRange } from './litres';
import type { ProductWords } from './product-words';

/** The coming weeks' need as a list to order from. */
export interface NeedView {
  /** "9 Feb – 5 Apr 2026". */
  readonly coming: string;
  /** Where the need comes from: cars in the diary and usual ones. */
  readonly from: string;
  /** What stands outside the sums, sentence by sentence. */
  readonly outside: readonly string[];
  readonly columns: readonly Column<ProductNeed>[];
  readonly rows: readonly ProductNeed[];
  readonly printed: readonly PrintedNeed[];
  /** Of the products whose cost is known; null when none is. */
  readonly totalCost: string | null;
  readonly csv: string;
}

/** A line of the printed list. */
export interface PrintedNeed {
  readonly product: string;
  readonly name: string;
  readonly expected: string;
  readonly range: string;
  readonly cost: string;
}

/** Turns the need into its list. Pure. */
export function needView(answer: ProductNeedAnswer, words: ProductWords): NeedView {
  const rows = [...answer.needs].sort((a, b) => b.ml - a.ml);
  const sign = currencySign(words.currency);
  const known = rows.filter(({ costCents }) => costCents !== null);
  return {
    coming: formatDateRange(answer.coming.from, answer.coming.to),
    from: fromWords(answer),
    outside: outsideWords(answer, words),
    columns: needColumns(rows, words, sign),
    rows,
    printed: rows.map((need) => ({
      product: need.product,
      name: words.productName(need.product),
      expected: litres(need.ml, need.upperMl - need.lowerMl),
      range: litresRange(need.lowerMl, need.upperMl),
      cost: need.costCents === null ? '' : formatMoney(need.costCents, words.currency),
    })),
    totalCost: known.length === 0 ? null : formatMoney(sumOf(known), words.currency),
    csv:
      rows.length === 1
        ? 'CSV of this product'
        : `CSV of these ${formatCount(rows.length)} products`,
  };
}

function fromWords({ weeks, jobs, period }: ProductNeedAnswer): string {
  const booked = weeks.reduce((sum, week) => sum + week.booked, 0);
  const usual = Math.round(weeks.reduce((sum, week) => sum + week.usual, 0));
  const behind = `${formatCars(jobs)} of ${formatDateRange(period.from, period.to)}`;
  if (booked + usual === 0) return `No car is in the diary, and none came in the time before.`;
  const known =
    jobs === 0
      ? 'but no car was finished in the time above, so each is taken at its norm, nothing usual is added and no range is known'
      : `each with what such cars took; usual going by ${behind}`;
  const coming = [
    ...(booked > 0 ? [`${formatCars(booked)} in the diary`] : ['Nothing in the diary']),
    ...(usual > 0 ? [`about ${formatCount(usual)}${booked > 0 ? ' more' : ''} as usual`] : []),
  ];
  return `${coming.join(', ')}, ${known}.`;
}

function outsideWords(
  { carsWithoutUse, missingCosts }: ProductNeedAnswer,
  words: ProductWords,
): string[] {
  const unknown = Math.round(carsWithoutUse);
  const uncosted = [...new Set(missingCosts.map(({ product }) => words.productName(product)))];
  return [
    ...(carsWithoutUse > 0
      ? [
          `${unknown === 0 ? 'Less than one' : `About ${formatCount(unknown)}`} of these cars ${unknown > 1 ? 'are' : 'is'} of a kind with no use known: neither 5 cars of it behind this nor a norm. Add by hand what ${unknown > 1 ? 'they take' : 'it takes'}.`,
        ]
      : []),
    ...(uncosted.length > 0
      ? [`No cost is known today of ${formatList(uncosted)}: the sum is without it.`]
      : []),
  ];
}

function needColumns(
  rows: readonly ProductNeed[],
  words: ProductWords,
  sign: string,
): readonly Column<ProductNeed>[] {
  const name = ({ product }: ProductNeed): string => words.productName(product);
  const known = rows.filter(({ costCents }) => costCents !== null);
  return [
    { key: 'product', label: 'Product', text: name, sortBy: name, total: 'all' },
    {
      key: 'ml',
      label: 'Expected',
      kind: 'number',
      strong: true,
      text: (need) => litres(need.ml, need.upperMl - need.lowerMl),
      sortBy: ({ ml }) => ml,
      total: '',
    },
    {
      key: 'range',
      label: '95 times of 100',
      kind: 'number',
      text: ({ lowerMl, upperMl }) => litresRange(lowerMl, upperMl),
      total: '',
    },
    {
      key: 'cost',
      label: sign,
      kind: 'number',
      text: ({ costCents }) => (costCents === null ? 'cost not known' : formatAmount(costCents)),
      muted: ({ costCents }) => costCents === null,
      sortBy: ({ costCents }) => costCents,
      total: known.length === 0 ? '' : formatAmount(sumOf(known)),
    },
  ];
}

function sumOf(needs: readonly ProductNeed[]): number {
  return needs.reduce((total, { costCents }) => total + (costCents ?? 0), 0);
}
