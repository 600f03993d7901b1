import { requireFinite } from './require-finite';

/** The values at one time: distinct and ascending, with how many lie before each (`before` is one longer). */
export interface TimeGroup {
  time: number;
  values: Float64Array;
  before: Float64Array;
}

/** Points gathered by time, earliest first; two points of one time make no slope. */
export function slopeGroups(times: ArrayLike<number>, values: ArrayLike<number>): TimeGroup[] {
  const n = times.length;
  if (values.length !== n) {
    throw new RangeError(`as many values as times: ${values.length} against ${n}`);
  }
  const byTime = new Map<number, number[]>();
  for (let index = 0; index < n; index += 1) {
    const time = requireFinite(times[index], 'time');
    const value = requireFinite(values[index], 'value');
    const group = byTime.get(time);
    if (group === undefined) byTime.set(time, [value]);
    else group.push(value);
  }
  return [...byTime].sort(([a], [b]) => a - b).map(([time, list]) => groupOf(time, list));
}

function groupOf(time: number, list: readonly number[]): TimeGroup {
  const sorted = new Float64Array(list).sort();
  const values = new Float64Array(sorted.length);
  const before = new Float64Array(sorted.length + 1);
  let distinct = 0;
  sorted.forEach((value, index) => {
    if (index === 0 || value !== sorted[index - 1]) values[distinct++] = value;
    before[distinct] = index + 1;
  });
  return { time, values: values.slice(0, distinct), before: before.slice(0, distinct + 1) };
}

/** How many pairs of points have different times. */
export function slopeCount(groups: readonly TimeGroup[]): number {
  let earlier = 0;
  let pairs = 0;
  for (const { before } of groups) {
    const size = before[before.length - 1] as number;
    pairs += earlier * size;
    earlier += size;
  }
  return pairs;
}

/** Of places each starting where the one before ends, which holds a rank; searched from the first named up to the end. */
export function holding(starts: Float64Array, rank: number, first: number, end: number): number {
  if ((starts[first + 1] as number) > rank) return first;
  let [low, high] = [first, end];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((starts[middle] as number) <= rank) low = middle;
    else high = middle;
  }
  return low;
}
