import { incompleteGamma } from './incomplete-gamma';

/**
 * The probability of a chi-square statistic beyond x, accurate however small: never 1 − cdf.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 26.4.19: Q of shape ν/2 at x/2.
 */
export function chiSquareUpperTail(x: number, degreesOfFreedom: number): number {
  if (!Number.isSafeInteger(degreesOfFreedom) || degreesOfFreedom < 1) {
    throw new RangeError(`degrees of freedom are whole and at least 1, got ${degreesOfFreedom}`);
  }
  return Math.exp(incompleteGamma(degreesOfFreedom / 2, x / 2).upper);
}
