import { holding, type TimeGroup } from './slope-groups';

/** A sorted sample of the slopes of all pairs, every pair equally likely; the same every time for the same points. */
export function sampleSlopes(
  groups: readonly TimeGroup[],
  size: number,
  random: () => number,
): Float64Array<ArrayBuffer> {
  const points = new Float64Array(groups.length + 1);
  const pairs = new Float64Array(groups.length + 1);
  groups.forEach(({ before }, index) => {
    const own = before[before.length - 1] as number;
    points[index + 1] = (points[index] as number) + own;
    pairs[index + 1] = (pairs[index] as number) + own * (points[index] as number);
  });
  const valueAt = (group: TimeGroup, rank: number) =>
    group.values[holding(group.before, rank, 0, group.values.length)] as number;
  const sample = new Float64Array(size);
  for (let taken = 0; taken < size; taken += 1) {
    const pair = Math.floor(random() * (pairs[groups.length] as number));
    const index = holding(pairs, pair, 0, groups.length);
    const to = groups[index] as TimeGroup;
    // The pair's place among its later group's pairs says both its points: one is the quotient, the other the remainder.
    const place = pair - (pairs[index] as number);
    const earlier = points[index] as number;
    const point = place % earlier;
    const other = holding(points, point, 0, index);
    const from = groups[other] as TimeGroup;
    const rise =
      valueAt(to, Math.floor(place / earlier)) - valueAt(from, point - (points[other] as number));
    sample[taken] = rise / (to.time - from.time) + 0;
  }
  return sample.sort();
}

/** Numbers from 0 to below 1. Source: G. Marsaglia, "Xorshift RNGs", Journal of Statistical Software 8 (2003), issue 14. */
export function generator(): () => number {
  let state = 2463534242;
  const step = () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return state >>> 0;
  };
  // 53 bits of two steps: there are more pairs than 32 bits can name.
  return () => ((step() >>> 5) * 2 ** 26 + (step() >>> 6)) / 2 ** 53;
}
