import { dateOfDay } from '#shared/domain/calendar';
import type { BranchCover } from './rated-cover';

/** How many claims as expected a calendar month is drawn towards no season by. */
const SEASON_WEIGHT = 20;

/** How many times as many claims as the rates give the network has in each calendar month. */
export function seasonOf(
  branches: readonly BranchCover[],
  counted: readonly { madeOn: string }[],
): number[] {
  const [made, expected] = [Array<number>(12).fill(0), Array<number>(12).fill(0)];
  for (const { madeOn } of counted) made[monthOf(madeOn)]! += 1;
  const { first, last } = reachOf(branches);
  const steps = new Float64Array(Math.max(0, last - first + 1));
  for (const { cars } of branches) {
    for (const { stretches } of cars) {
      for (const { from, to, cell } of stretches) {
        steps[from - first]! += cell.rate;
        steps[to - first]! -= cell.rate;
      }
    }
  }
  let rate = 0;
  steps.forEach((step, day) => {
    rate += step;
    expected[monthOf(dateOfDay(first + day))]! += rate;
  });
  return made.map((claims, month) => (claims + SEASON_WEIGHT) / (expected[month]! + SEASON_WEIGHT));
}

/** The place of a date's month in its year. */
export function monthOf(date: string): number {
  return Number(date.slice(5, 7)) - 1;
}

/** The first day of any cover, and the day after the last one that has been. */
function reachOf(branches: readonly BranchCover[]): { first: number; last: number } {
  let [first, last] = [Infinity, -Infinity];
  for (const { cars } of branches) {
    for (const { stretches } of cars) {
      first = Math.min(first, stretches[0]!.from);
      last = Math.max(last, stretches.at(-1)!.to);
    }
  }
  return { first, last };
}
