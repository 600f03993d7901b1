import type { ProductUse } from '#shared/contracts/products';
import { formatShare, formatShareRange } from '../../ui/format';
import { BODY_TYPE_PLURALS } from '../../ui/words';

/** What the page needs to turn codes and cents into words. */
export interface ProductWords {
  /** ISO 4217 code. */
  readonly currency: string;
  readonly branchName: (code: string) => string;
  readonly packageWord: (code: string) => string;
  readonly productName: (code: string) => string;
  /** Whether it is a wax, which flows the better the warmer it is. */
  readonly isWax: (code: string) => boolean;
}

/** Limits of under and over as shares of the norm (rule 37). */
export const UNDER = 0.7;
export const OVER = 1.3;

/** A kind of car as a sentence says it: "full hatchbacks". */
export function carsOfKind(
  { package: sold, bodyType }: Pick<ProductUse, 'package' | 'bodyType'>,
  words: ProductWords,
): string {
  return `${words.packageWord(sold)} ${BODY_TYPE_PLURALS[bodyType]}`;
}

/** A share of cars that is there: never rounded away to 0. */
export function presentShare(share: number): string {
  return share > 0 && share < 0.005 ? `<${formatShare(0.01)}` : formatShare(share);
}

/** The interval of a share, "92–96 %", nothing where there is none. */
export function intervalText(lower: number | null, upper: number | null): string {
  return lower === null || upper === null ? '' : formatShareRange(lower, upper);
}
