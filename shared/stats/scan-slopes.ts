import { holding, type TimeGroup } from './slope-groups';

/** What a scan saw: how many slopes lie below the interval, how many in it, and those taken from it. */
export interface SlopeScan {
  below: number;
  inside: number;
  taken: Float64Array;
}

/**
 * Counts the pair slopes below and within a closed interval, exactly as doubles compare, and takes some of those within: in
 * the scan's order, one after every `stride()` of them (always 1 takes all). Within two times a slope rises with the later
 * value and falls with the earlier, so two marks moving along the earlier values suffice: a scan costs the number of times by
 * the number of distinct points, however many pairs those are.
 */
export function scanSlopes(
  groups: readonly TimeGroup[],
  [low, high]: readonly [low: number, high: number],
  stride: () => number,
  room: number,
): SlopeScan {
  let taken = new Float64Array(room);
  let count = 0;
  let [below, inside] = [0, 0];
  let next = stride() - 1;
  for (let later = 1; later < groups.length; later += 1) {
    for (let earlier = 0; earlier < later; earlier += 1) {
      const from = groups[earlier] as TimeGroup;
      const to = groups[later] as TimeGroup;
      const run = to.time - from.time;
      const { values, before } = from;
      const size = before[values.length] as number;
      const least = surely(low, run, -1);
      const lowDoubt = surely(low, run, 1);
      const most = surely(high, run, 1);
      const highDoubt = surely(high, run, -1);
      // Earlier values before `start` give slopes above the interval, those from `end` on slopes below it.
      let [start, end] = [0, 0];
      for (let row = 0; row < to.values.length; row += 1) {
        const value = to.values[row] as number;
        for (; end < values.length; end += 1) {
          const rise = value - (values[end] as number);
          if (rise < least || (rise <= lowDoubt && rise / run < low)) break;
        }
        for (; start < end; start += 1) {
          const rise = value - (values[start] as number);
          if (rise < highDoubt || (rise <= most && rise / run <= high)) break;
        }
        const times = (to.before[row + 1] as number) - (to.before[row] as number);
        const first = before[start] as number;
        below += times * (size - (before[end] as number));
        inside += times * ((before[end] as number) - first);
        if (next >= inside) continue;
        const origin = inside - times * ((before[end] as number) - first);
        for (let at = start; next < inside; next += stride()) {
          const rank = first + Math.floor((next - origin) / times);
          if ((before[at + 1] as number) <= rank) at = holding(before, rank, at + 1, end);
          if (count === taken.length) taken = grown(taken);
          // Adding 0 makes −0 a 0, so that a level trend never depends on the order of its points.
          taken[count++] = (value - (values[at] as number)) / run + 0;
        }
      }
    }
  }
  return { below, inside, taken: taken.subarray(0, count) };
}

/** slope × run, moved past any rounding in the given direction: only between the two is the division itself needed. */
function surely(slope: number, run: number, direction: 1 | -1): number {
  const rise = slope * run;
  if (!Number.isFinite(rise)) return direction * Infinity;
  return rise + direction * (Math.abs(rise) * 1e-15 + 1e-290);
}

function grown(list: Float64Array): Float64Array<ArrayBuffer> {
  const longer = new Float64Array(list.length * 2 + 16);
  longer.set(list);
  return longer;
}
