import { requireFinite } from './require-finite';

/** Mean and spread of a sample; the spread (divisor n − 1) is undefined for a single value. */
export interface SampleMoments {
  n: number;
  mean: number;
  variance: number | undefined;
  standardDeviation: number | undefined;
}

/**
 * Mean, sample variance (divisor n − 1) and standard deviation in one pass that never subtracts large squares; `undefined`
 * for an empty list.
 *
 * Source: B. P. Welford, "Note on a method for calculating corrected sums of squares and products", Technometrics 4 (1962) 419–420.
 */
export function sampleMoments(values: ArrayLike<number>): SampleMoments | undefined {
  const n = values.length;
  if (n === 0) return undefined;
  let mean = 0;
  let squares = 0;
  for (let index = 0; index < n; index += 1) {
    const value = requireFinite(values[index], 'value');
    const fromOldMean = value - mean;
    mean += fromOldMean / (index + 1);
    squares += fromOldMean * (value - mean);
  }
  if (n === 1) return { n, mean, variance: undefined, standardDeviation: undefined };
  const variance = squares / (n - 1);
  return { n, mean, variance, standardDeviation: Math.sqrt(variance) };
}
