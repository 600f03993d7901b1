import type { BranchMeasure } from '#shared/domain/vocabulary';
import { formatCount, formatNumber, formatShare, formatSignedShare } from './format';

/** What branches are compared by, as people say it. */
export const MEASURE_NAMES: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'overrun',
  rot: 'rot found',
  claims: 'claims',
  product: 'product use',
  margin: 'margin',
};

/** What a measure counts, with its unit, for the head of a column. */
export const MEASURE_UNITS: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'overrun, % over the estimate',
  rot: 'rot found, % of cars',
  claims: 'claims, per 1,000 car-years',
  product: 'product use, % of norm',
  margin: 'margin, % of what is billed',
};

/** A value in the unit of its measure: an overrun ratio of 1.2 is `+20 %`, product and shares are per cent, claims a number. */
export function formatMeasure(measure: BranchMeasure, value: number): string {
  return formatted(measure, value, measure === 'claims' && value < 10 ? 1 : 0);
}

/** A value that somebody set, with all the digits they gave it: `+7.5 %`. */
export function formatTarget(measure: BranchMeasure, value: number): string {
  return formatted(measure, value, measureToType(measure, value).split('.')[1]?.length ?? 0);
}

/** A value as it is typed, without its unit: an overrun ratio of 1.2 is `20`. */
export function measureToType(measure: BranchMeasure, value: number): string {
  const typed = measure === 'claims' ? value : (measure === 'overrun' ? value - 1 : value) * 100;
  return String(Number(typed.toFixed(4)));
}

/** What was typed, in the unit of the API; `undefined` for what is no number from 0 on (an overrun may lie under the estimate). */
export function measureOfTyped(measure: BranchMeasure, typed: string): number | undefined {
  const match = /^([-\u2212+]?)(\d{1,4})(?:[.,](\d{1,2}))?(%?)$/.exec(
    typed.replace(/[\s\u00a0\u202f]/g, ''),
  );
  if (!match) return undefined;
  const [, sign = '', whole = '', part = '0', percent = ''] = match;
  const value = (sign === '-' || sign === '\u2212' ? -1 : 1) * Number(`${whole}.${part}`);
  if (measure === 'claims') return value >= 0 && value <= 1000 && !percent ? value : undefined;
  const share = Number(((measure === 'overrun' ? 100 + value : value) / 100).toFixed(6));
  if (share < 0 || (measure !== 'overrun' && sign !== '' && value !== 0)) return undefined;
  return share > (measure === 'margin' || measure === 'rot' ? 1 : 10) ? undefined : share;
}

/** A difference as people say it, without its sign: `6 points`, claims `2.1 per 1,000 car-years`. */
export function formatMeasureChange(measure: BranchMeasure, change: number): string {
  return measure === 'claims'
    ? `${amountOfChange(measure, change)} per 1,000 car-years`
    : `${amountOfChange(measure, change)} ${amountOfChange(measure, change) === '1' ? 'point' : 'points'}`;
}

/** The number of a difference alone: percentage points, or claims per 1,000 car-years. */
export function amountOfChange(measure: BranchMeasure, change: number): string {
  const size = Math.abs(change);
  if (measure === 'claims') return formatNumber(size, size < 10 ? 1 : 0);
  return size * 100 < 0.95 && size > 0 ? formatNumber(size * 100, 1) : formatCount(size * 100);
}

function formatted(measure: BranchMeasure, value: number, decimals: number): string {
  switch (measure) {
    case 'overrun':
      return formatSignedShare(value - 1, decimals);
    case 'claims':
      return formatNumber(value, decimals);
    default:
      return formatShare(value, decimals);
  }
}
