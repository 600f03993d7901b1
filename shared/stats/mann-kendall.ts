import { twoSidedP } from './normal-distribution';
import { requireFinite } from './require-finite';

/** The Mann–Kendall test of a trend: S, its variance, the standardised Z and the two-sided p. */
export interface MannKendall {
  n: number;
  s: number;
  variance: number;
  z: number;
  p: number;
}

/**
 * Whether values in time order (one a time) tend to rise or fall: S = Σ sign(xⱼ − xᵢ) over i < j, its variance corrected for
 * ties, Z corrected for continuity, p two-sided from the normal upper tail. All values equal give S 0, Z 0, p 1.
 * `undefined` with fewer than 2 values.
 *
 * Source: H. B. Mann, "Nonparametric tests against trend", Econometrica 13 (1945) 245–259; ties as in M. G. Kendall,
 * "Rank Correlation Methods".
 */
export function mannKendall(values: ArrayLike<number>): MannKendall | undefined {
  const n = values.length;
  if (n < 2) return undefined;
  let s = 0;
  const timesSeen = new Map<number, number>();
  for (let later = 0; later < n; later += 1) {
    const value = requireFinite(values[later], 'value');
    timesSeen.set(value, (timesSeen.get(value) ?? 0) + 1);
    for (let earlier = 0; earlier < later; earlier += 1) {
      s += Math.sign(value - (values[earlier] as number));
    }
  }
  let spread = spreadOf(n);
  for (const tied of timesSeen.values()) spread -= spreadOf(tied);
  const variance = spread / 18;
  const z = s === 0 ? 0 : (s - Math.sign(s)) / Math.sqrt(variance);
  return { n, s, variance, z, p: twoSidedP(z) };
}

/** 18 times the variance of S over n untied values, and what a group of n equal values takes from it. */
function spreadOf(n: number): number {
  return n * (n - 1) * (2 * n + 5);
}
