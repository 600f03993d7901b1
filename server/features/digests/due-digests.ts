import { addDays, addMonths, dayNumber, isoWeek, mondayOf } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';

/** Digests that a day asks for. */
export type DueDigest =
  | { kind: 'monday_digest'; period: string }
  | { kind: 'region_digest'; period: string; days: Period; carsOf: Period }
  | { kind: 'month_digest'; period: string; days: Period; carsOf: Period };

/** Monday to Thursday: a mail about last week is no use on a Friday. */
const MOST_DAYS_AFTER_MONDAY = 4;
const LAST_DAY_OF_MONTH = 7;

/**
 * What is due on a day: the week that ended from Monday to Thursday, the month that ended from the 1st to the 7th, so that a
 * server that was down catches up. Regions are told what changed after the look that they were told of last, up to `today`;
 * the first time, since last Monday.
 */
export function dueDigests(day: string, today: string, lookTold: string | undefined): DueDigest[] {
  const monday = mondayOf(day);
  const due: DueDigest[] = [];
  if (dayNumber(day) - dayNumber(monday) < MOST_DAYS_AFTER_MONDAY) {
    const lastMonday = addDays(monday, -7);
    const period = isoWeek(lastMonday);
    const from = lookTold === undefined ? lastMonday : addDays(lookTold, 1);
    const carsOf = { from: lastMonday, to: addDays(monday, -1) };
    due.push({ kind: 'monday_digest', period });
    due.push({ kind: 'region_digest', period, days: { from, to: today }, carsOf });
  }
  if (Number(day.slice(8)) <= LAST_DAY_OF_MONTH) {
    const first = addMonths(`${day.slice(0, 7)}-01`, -1);
    const days = { from: first, to: addDays(addMonths(first, 1), -1) };
    due.push({ kind: 'month_digest', period: first.slice(0, 7), days, carsOf: days });
  }
  return due;
}
