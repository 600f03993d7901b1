import type { ProductUse } from '#shared/contracts/products';
import type { UseBoxGroup, UseBoxInput, UseBoxRow } from '../../charts/use-box/use-box-input';
import { formatCars, formatCount, formatShare } from '../../ui/format';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { carsOfKind, OVER, presentShare, type ProductWords, UNDER } from './product-words';

/** Shares of the norm with words of their own. */
const MARKS = [
  { value: UNDER, text: '70 %' },
  { value: 1, text: 'norm' },
  { value: OVER, text: '130 %' },
  { value: 0.5, text: 'half' },
  { value: 2, text: 'twice' },
];
/** From one car in twenty under the norm's limit on, a row is set in bold (own choice). */
const STRONG_SHARE = 0.05;

/** The spread of one product by package and body type, the packages and kinds of most cars first. */
export function usePicture(
  product: string,
  rows: readonly ProductUse[],
  words: ProductWords,
): UseBoxInput {
  const packages = [...new Set(rows.map((row) => row.package))];
  const groups = packages
    .map((code) => rows.filter((row) => row.package === code))
    .sort((a, b) => carsOf(b) - carsOf(a))
    .map((ofPackage) => groupOf(ofPackage, words));
  return {
    summary: summarise(product, rows, words),
    groups,
    marks: MARKS,
    limits: [UNDER, OVER],
  };
}

function groupOf(rows: readonly ProductUse[], words: ProductWords): UseBoxGroup {
  const sold = rows[0]!.package;
  const sorted = [...rows].sort((a, b) => b.cars - a.cars);
  const few = sorted.filter(({ medianMl }) => medianMl === null);
  return {
    key: sold,
    label: words.packageWord(sold),
    rows: [
      ...sorted.filter(({ medianMl }) => medianMl !== null).map(boxRow),
      ...(few.length > 0 ? [fewRow(few)] : []),
    ],
  };
}

function boxRow(row: ProductUse): UseBoxRow {
  const norm = row.normMl ?? 1;
  const of = (ml: number | null): number => (ml ?? 0) / norm;
  return {
    key: `${row.package} ${row.bodyType}`,
    label: BODY_TYPE_NAMES[row.bodyType],
    count: formatCount(row.cars),
    spread: {
      p10: of(row.p10Ml),
      p25: of(row.p25Ml),
      median: of(row.medianMl),
      p75: of(row.p75Ml),
      p90: of(row.p90Ml),
    },
    under: row.under ? `${presentShare(row.underShare ?? 0)} under` : '',
    over: row.over ? `${presentShare(row.overShare ?? 0)} over` : '',
    strong: (row.underShare ?? 0) >= STRONG_SHARE,
    text: '',
  };
}

/** Kinds with fewer than 5 cars each share one hatched row; the table has them singly. */
function fewRow(rows: readonly ProductUse[]): UseBoxRow {
  const [only, ...more] = rows;
  return {
    key: `${only!.package} few`,
    label:
      more.length === 0
        ? BODY_TYPE_NAMES[only!.bodyType]
        : `${formatCount(rows.length)} more kinds`,
    count: formatCount(carsOf(rows)),
    spread: null,
    under: '',
    over: '',
    strong: false,
    text: more.length === 0 ? 'too few cars yet' : 'too few cars of each yet',
  };
}

function carsOf(rows: readonly ProductUse[]): number {
  return rows.reduce((sum, { cars }) => sum + cars, 0);
}

function summarise(product: string, rows: readonly ProductUse[], words: ProductWords): string {
  const said = rows.map((row) => {
    const kind = `${carsOfKind(row, words)} (${formatCars(row.cars)})`;
    if (row.medianMl === null || row.normMl === null) return `${kind} too few cars yet`;
    return `${kind} half got ${formatShare(row.medianMl / row.normMl)} of the norm or more, ${formatShare(row.underShare ?? 0)} under 70 %, ${formatShare(row.overShare ?? 0)} over 130 %`;
  });
  return `${words.productName(product)} against the norm: ${said.join('; ')}.`;
}
