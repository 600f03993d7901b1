import { compensatedSum } from './compensated-sum';
import { Z_95 } from './normal-distribution';
import { requireFinite } from './require-finite';

/** A ratio of sums with its standard error and 95 % interval; these are undefined for a single pair. */
export interface RatioEstimate {
  n: number;
  ratio: number;
  standardError: number | undefined;
  lower: number | undefined;
  upper: number | undefined;
}

/**
 * Σ actual / Σ estimated over pairs, with the ratio estimator's standard error sqrt(Σ(aᵢ − r·eᵢ)² / (n(n − 1))) / ē, without
 * finite-population correction, and r ± 1.959964 standard errors (rule 26). `undefined` with no pair or when the estimates
 * add up to 0.
 *
 * Source: W. G. Cochran, "Sampling Techniques", 3rd edition (1977), chapter 6, variance of the ratio estimate from a sample.
 */
export function ratioEstimate(
  actual: ArrayLike<number>,
  estimated: ArrayLike<number>,
): RatioEstimate | undefined {
  const n = actual.length;
  if (estimated.length !== n) {
    throw new RangeError(`as many estimates as actual values: ${estimated.length} against ${n}`);
  }
  for (let index = 0; index < n; index += 1) {
    if (requireFinite(estimated[index], 'estimate') < 0) {
      throw new RangeError('an estimate must not be negative');
    }
  }
  const estimatedSum = compensatedSum(estimated);
  if (estimatedSum === 0) return undefined;
  const ratio = compensatedSum(actual) / estimatedSum;
  if (n < 2) return { n, ratio, standardError: undefined, lower: undefined, upper: undefined };
  const squares = new Float64Array(n);
  for (let index = 0; index < n; index += 1) {
    squares[index] = ((actual[index] as number) - ratio * (estimated[index] as number)) ** 2;
  }
  const standardError = Math.sqrt(compensatedSum(squares) / (n * (n - 1))) / (estimatedSum / n);
  return {
    n,
    ratio,
    standardError,
    lower: ratio - Z_95 * standardError,
    upper: ratio + Z_95 * standardError,
  };
}
