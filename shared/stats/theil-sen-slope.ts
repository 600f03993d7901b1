import { requireFinite } from './require-finite';
import { selectSlopes } from './select-slopes';
import { slopeCount, slopeGroups, type TimeGroup } from './slope-groups';

/**
 * The median of the slopes of all pairs (value units per time unit), pairs of equal time left out; always exact, also where
 * the pairs are too many to write out. `undefined` when no two times differ.
 *
 * Its time grows with the number of distinct times by the number of points: quick for hundreds of thousands of points at some
 * hundred times, and for some thousands of points at times of their own.
 *
 * Source: P. K. Sen, "Estimates of the regression coefficient based on Kendall's tau", JASA 63 (1968) 1379–1389.
 */
export function theilSenSlope(
  times: ArrayLike<number>,
  values: ArrayLike<number>,
): number | undefined {
  const groups = slopeGroups(times, values);
  const count = slopeCount(groups);
  return count === 0 ? undefined : slopeAtRank(groups, (count - 1) / 2);
}

/** The slope at a rank from 0, linear between two neighbours. */
export function slopeAtRank(groups: readonly TimeGroup[], rank: number): number {
  const index = Math.floor(rank);
  const [below, above] = selectSlopes(groups, index, Math.ceil(rank));
  requireFinite(below, 'slope');
  requireFinite(above, 'slope');
  // Never past the upper neighbour, whatever the product rounds to.
  return Math.min(below + (rank - index) * (above - below), above);
}
