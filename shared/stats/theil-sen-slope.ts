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
  return count === 0 ? undefined : slopesAtRanks(groups, [(count - 1) / 2])[0];
}

/** The slopes at some ranks from 0 (ascending), each linear between its two neighbours. */
export function slopesAtRanks(groups: readonly TimeGroup[], ranks: readonly number[]): number[] {
  const slopes = selectSlopes(
    groups,
    ranks.flatMap((rank) => [Math.floor(rank), Math.ceil(rank)]),
  );
  return ranks.map((rank, index) => {
    const below = requireFinite(slopes[2 * index], 'slope');
    const above = requireFinite(slopes[2 * index + 1], 'slope');
    // Never past the upper neighbour, whatever the product rounds to.
    return Math.min(below + (rank - Math.floor(rank)) * (above - below), above);
  });
}
