import type { CurveGroup, WarrantyAnswer, WarrantyBranch } from '#shared/contracts/warranty';
import { giveOrTake as halfInterval } from '#shared/domain/give-or-take';
import { formatCount, formatNumber, formatShare } from '../../ui/format';

/** What the page needs to turn codes and cents into words. */
export interface WarrantyWords {
  /** ISO 4217 code. */
  readonly currency: string;
  readonly branchName: (code: string) => string;
  readonly regionName: (code: string) => string;
  readonly packageWord: (code: string) => string;
}

/** Half of the 95 % interval of a sum, in minor units: what "give or take" says; null where it is not known. */
export function giveOrTake(standardErrorCents: number | null): number | null {
  return standardErrorCents === null ? null : halfInterval(standardErrorCents);
}

/** A half-year as it stands in rows: `2024-H1` → "2024 H1". */
export function halfYearWords(halfYear: string): string {
  return halfYear.replace('-', ' ');
}

/** First and last day of a half-year. */
export function halfYearDays(halfYear: string): { readonly from: string; readonly to: string } {
  const [year = '', half] = halfYear.split('-');
  return half === 'H1'
    ? { from: `${year}-01-01`, to: `${year}-06-30` }
    : { from: `${year}-07-01`, to: `${year}-12-31` };
}

/** A group of curves by its name. */
export function groupName(by: CurveGroup, key: string, words: WarrantyWords): string {
  switch (by) {
    case 'package':
      return words.packageWord(key);
    case 'region':
      return words.regionName(key);
    case 'branch':
      return words.branchName(key);
    case 'ageBand':
      return `${key.replace('-', '–')} years`;
    case 'cohort':
      return halfYearWords(key);
  }
}

/** A share of cars near all of them: whole per cent from 10 % off, else a tenth where the whole would hide the difference. */
export function freeShare(share: number): string {
  return share > 0.99 && share < 1 ? formatShare(share, 1) : formatShare(share);
}

/** Claims expected: whole, or to the tenth below ten. */
export function expectedText(expected: number): string {
  return expected < 9.95 ? formatNumber(expected, 1) : formatCount(expected);
}

/** How far observed stands from expected; missed where the whole interval lies on one side of 1. */
export function standOf({
  lower,
  upper,
}: Pick<WarrantyBranch, 'lower' | 'upper'>): 'as_expected' | 'below' | 'above' {
  if (lower !== null && lower > 1) return 'above';
  if (upper !== null && upper < 1) return 'below';
  return 'as_expected';
}

/** A ratio, to the tenth. */
export function ratioText(ratio: number | null): string {
  return ratio === null ? '' : formatNumber(ratio, 1);
}

/** A ratio with where it stands: "3.5 above"; alone where its interval holds 1. */
export function standingText(
  ratio: number,
  interval: Pick<WarrantyBranch, 'lower' | 'upper'>,
): string {
  const stand = standOf(interval);
  return stand === 'as_expected' ? ratioText(ratio) : `${ratioText(ratio)} ${stand}`;
}

/** The interval of a ratio: "1.3–2.1". */
export function ratioRange(lower: number | null, upper: number | null): string {
  return lower === null || upper === null
    ? ''
    : `${formatNumber(lower, 1)}–${formatNumber(upper, 1)}`;
}

/** A p-value as it is read: "p < 0.001", "p = 0.03". */
export function pText(p: number): string {
  if (p < 0.001) return 'p\u00a0<\u00a00.001';
  return `p\u00a0=\u00a0${formatNumber(p, p < 0.1 ? (p < 0.01 ? 3 : 2) : 1)}`;
}

/** Whether the answer compares one branch, which needs a reference from outside it. */
export function standsAlone({ scope, reference }: WarrantyAnswer): boolean {
  return scope.branches.length === 1 && reference === 'scope';
}
