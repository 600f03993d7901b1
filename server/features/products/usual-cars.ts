import { sampleMoments } from '#shared/stats/sample-moments';

/** Cars that usually come to a branch in a week. */
export interface UsualCars {
  mean: number;
  /** Of the number from week to week. */
  variance: number;
  /** Weeks behind the mean. */
  weeks: number;
}

/**
 * What a branch's whole weeks say of the next one; `undefined` without any. A single week has no spread of its own: it is taken
 * as a Poisson number, whose variance is its mean.
 */
export function usualCars(weekly: readonly number[]): UsualCars | undefined {
  const moments = sampleMoments(weekly);
  if (!moments) return undefined;
  const { mean, variance = mean, n } = moments;
  return { mean, variance, weeks: n };
}
