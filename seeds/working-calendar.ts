import { dateOfDay, dayNumber } from '#shared/domain/calendar';
import { normal, pickWeighted, type Random } from './random-draws';

/** Days here are day numbers (days since 1970-01-01), as `dayNumber` of the calendar gives them. */

/** Days on which every workshop is closed, by month and day. Invented for the demo. */
const CLOSED = new Set(['01-01', '05-01', '12-24', '12-25', '12-26', '12-31']);

/** Whether a branch works on a day: Monday to Friday, on Saturdays where it opens then, never on a closed day. */
export function isWorkingDay(day: number, workWeek: WorkWeek): boolean {
  const weekday = weekdayOf(day);
  if (weekday === 6 || (weekday === 5 && workWeek === 'to-friday')) return false;
  return !CLOSED.has(dateOfDay(day).slice(5));
}

export type WorkWeek = 'to-friday' | 'to-saturday';

/** 0 is Monday, 6 Sunday. */
export function weekdayOf(day: number): number {
  return (((day + 3) % 7) + 7) % 7;
}

/** The last working day on or before a day. */
export function workingDayBefore(day: number, workWeek: WorkWeek): number {
  let at = day;
  while (!isWorkingDay(at, workWeek)) at -= 1;
  return at;
}

/** The first working day on or after a day. */
export function workingDayAfter(day: number, workWeek: WorkWeek): number {
  let at = day;
  while (!isWorkingDay(at, workWeek)) at += 1;
  return at;
}

/** The working day a number of working days before one. */
export function workingDaysEarlier(day: number, days: number, workWeek: WorkWeek): number {
  let at = workingDayBefore(day, workWeek);
  for (let left = days; left > 0; left -= 1) at = workingDayBefore(at - 1, workWeek);
  return at;
}

/** How busy the trade is in a week: before winter most, in July and over the turn of the year least. */
export function seasonOf(monday: number): number {
  const thursday = dateOfDay(monday + 3);
  const week = Math.floor((monday + 3 - dayNumber(`${thursday.slice(0, 4)}-01-01`)) / 7) + 1;
  if (week >= 52 || week === 1) return 0.45;
  if (week >= 28 && week <= 30) return 0.6;
  if (week >= 36 && week <= 47) return 1.1;
  if (week >= 14 && week <= 22) return 1.0;
  return 0.9;
}

/** How many cars a branch finishes in a week. */
export function carsInWeek(random: Random, carsPerWeek: number, monday: number): number {
  const expected = carsPerWeek * seasonOf(monday);
  return Math.max(1, Math.min(16, Math.round(normal(random, expected, 1.25))));
}

/** The day of a week on which a car is finished; cars go out towards the weekend. */
export function completionDay(random: Random, monday: number, workWeek: WorkWeek): number {
  const weekday = pickWeighted(random, WEEKDAYS);
  const wanted = monday + (weekday === 5 && workWeek === 'to-friday' ? 4 : weekday);
  // A closed day moves its cars to the working day before, in the same week where there is one.
  const before = workingDayBefore(wanted, workWeek);
  return before >= monday ? before : workingDayAfter(wanted, workWeek);
}

const WEEKDAYS: readonly (readonly [number, number])[] = [
  [0, 16],
  [1, 19],
  [2, 20],
  [3, 21],
  [4, 22],
  [5, 4],
];
