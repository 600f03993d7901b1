import { addDays, dayNumber, daysBetween } from '#shared/domain/calendar';
import type { FactsByKind } from '#shared/domain/signal-facts';
import { plainSignal, type FoundSignal } from './found-signal';

/** How far back a branch's own habits are read: a year and its turn, so that closed days at the same time last year are known. */
export const HABIT_DAYS = 400;
/** Days with a job before anything of a branch is usual. */
const FEWEST_DAYS = 20;
/** A weekday is one of a branch's own if jobs came on at least this share of those weekdays. */
const OWN_WEEKDAY = 0.1;
/** Never fewer quiet days than this, a week of work: small branches have empty days. */
const FEWEST_QUIET = 5;
/** Nor more usual ones than three weeks of work, or twice its middle gap: one long silence must not make the next one usual. */
const MOST_USUAL = 15;

/** When jobs first reached the network from a branch. */
export interface Arrivals {
  branchId: number;
  today: string;
  /** Whether it works no more. */
  closed: boolean;
  /** Local days on which at least one new job arrived, oldest first. */
  days: readonly string[];
}

/**
 * No job for longer than ever in the last year at that branch, counted in days on which it usually sends: weekends and days on
 * which it never sends do not count, its holidays of a year ago are part of what is usual. Today is not over and not counted.
 */
export function detectSilence({ branchId, today, closed, days }: Arrivals): FoundSignal[] {
  const last = days.at(-1);
  if (closed || last === undefined || days.length < FEWEST_DAYS) return [];
  const own = ownWeekdays(days);
  const gaps = days.slice(1).map((day, index) => ownDaysBetween(own, days[index] as string, day));
  const usual = usualGap(gaps);
  const quiet = ownDaysBetween(own, last, today);
  if (quiet <= usual) return [];
  const facts: FactsByKind['silence'] = {
    lastReceivedOn: last,
    quietDays: quiet,
    usualDays: usual,
  };
  return [
    plainSignal({
      branchId,
      kind: 'silence',
      key: 'silence',
      since: addDays(last, 1),
      strength: quiet / usual,
      facts: { ...facts },
      cars: 0,
      listed: [],
    }),
  ];
}

/** The longest usual gap: the longest there was, within bounds. */
function usualGap(gaps: readonly number[]): number {
  const sorted = [...gaps].sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)] ?? 0;
  const longest = sorted.at(-1) ?? 0;
  return Math.max(FEWEST_QUIET, Math.min(longest, Math.max(MOST_USUAL, 2 * middle)));
}

/** Weekdays (0 is Monday) on which a branch sends; all seven where it has no such habit. */
function ownWeekdays(days: readonly string[]): ReadonlySet<number> {
  const counts = new Map<number, number>();
  for (const day of days) counts.set(weekday(day), (counts.get(weekday(day)) ?? 0) + 1);
  const weeks = 1 + daysBetween(days[0] as string, days.at(-1) as string) / 7;
  const own = [0, 1, 2, 3, 4, 5, 6].filter((n) => (counts.get(n) ?? 0) / weeks >= OWN_WEEKDAY);
  return new Set(own.length > 0 ? own : [0, 1, 2, 3, 4, 5, 6]);
}

/** A branch's own days strictly between two. */
function ownDaysBetween(own: ReadonlySet<number>, from: string, to: string): number {
  const [first, end] = [dayNumber(from) + 1, dayNumber(to)];
  const weeks = Math.max(0, Math.floor((end - first) / 7));
  let count = weeks * own.size;
  for (let day = first + 7 * weeks; day < end; day += 1) {
    if (own.has(weekdayOf(day))) count += 1;
  }
  return count;
}

function weekday(date: string): number {
  return weekdayOf(dayNumber(date));
}

/** 1970-01-01 was a Thursday. */
function weekdayOf(day: number): number {
  return (((day + 3) % 7) + 7) % 7;
}
