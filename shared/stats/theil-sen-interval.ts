import { normalQuantile } from './normal-distribution';
import { slopeCount, slopeGroups, type TimeGroup } from './slope-groups';
import { slopesAtRanks } from './theil-sen-slope';

/** A slope with its 95 % limits; a limit is absent where the pairs are too few to have one. */
export interface SlopeInterval {
  slope: number;
  lower?: number;
  upper?: number;
}

/**
 * The Theil–Sen slope with its 95 % limits: of N slopes those ranked (N − C)/2 and (N + C)/2 + 1, linear between ranks, with
 * C = 1.96 standard deviations of Kendall's S, its variance corrected for equal values and equal times. `undefined` when no
 * two times differ.
 *
 * Source: P. K. Sen, JASA 63 (1968) 1379–1389; the ranks as in R. O. Gilbert, "Statistical Methods for Environmental
 * Pollution Monitoring" (1987), section 16.5; the variance with ties in both as in M. G. Kendall, "Rank Correlation Methods",
 * chapter 4.
 */
export function theilSenInterval(
  times: ArrayLike<number>,
  values: ArrayLike<number>,
): SlopeInterval | undefined {
  const groups = slopeGroups(times, values);
  const count = slopeCount(groups);
  if (count === 0) return undefined;
  const reach = normalQuantile(0.975) * Math.sqrt(kendallVariance(groups));
  const middle = (count - 1) / 2;
  // Ranks from 0 here: one less than in the book. The upper limit mirrors the lower.
  const rank = (count - reach) / 2 - 1;
  if (rank < 0) return { slope: slopesAtRanks(groups, [middle])[0] as number };
  const [lower, slope, upper] = slopesAtRanks(groups, [rank, middle, count - 1 - rank]);
  return { slope: slope as number, lower: lower as number, upper: upper as number };
}

/** The variance of Kendall's S under no trend, with ties in times and in values. */
function kendallVariance(groups: readonly TimeGroup[]): number {
  const sizes = groups.map(({ before }) => before[before.length - 1] as number);
  const equal = new Map<number, number>();
  for (const { values, before } of groups) {
    values.forEach((value, index) => {
      const times = (before[index + 1] as number) - (before[index] as number);
      equal.set(value, (equal.get(value) ?? 0) + times);
    });
  }
  const inTime = tieSums(sizes);
  const inValue = tieSums([...equal.values()]);
  const n = sizes.reduce((sum, size) => sum + size, 0);
  const whole = n * (n - 1) * (2 * n + 5);
  const triples = n > 2 ? (inTime.triples / (n * (n - 1))) * (inValue.triples / (9 * (n - 2))) : 0;
  const pairs = (inTime.pairs / n) * (inValue.pairs / (2 * (n - 1)));
  return Math.max(0, (whole - inTime.spread - inValue.spread) / 18 + triples + pairs);
}

function tieSums(sizes: readonly number[]): { pairs: number; triples: number; spread: number } {
  const sums = { pairs: 0, triples: 0, spread: 0 };
  for (const t of sizes) {
    sums.pairs += t * (t - 1);
    sums.triples += t * (t - 1) * (t - 2);
    sums.spread += t * (t - 1) * (2 * t + 5);
  }
  return sums;
}
