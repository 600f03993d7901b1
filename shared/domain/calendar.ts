import { AGE_BANDS, type AgeBand } from './vocabulary';

/**
 * Dates as text (`YYYY-MM-DD`), months as `YYYY-MM`, ISO 8601 weeks as `YYYY-Www`. No clock, no time zone: a day is a number
 * of days since 1970-01-01 in the proleptic Gregorian calendar.
 */

const DATE = /^[1-9]\d{3}-\d{2}-\d{2}$/;

/** Days since 1970-01-01 of a civil date. Source: era-based algorithm of H. Hinnant, "chrono-compatible low-level date algorithms". */
export function dayNumber(date: string): number {
  const year = Number(date.slice(0, 4));
  const month = Number(date.slice(5, 7));
  const day = Number(date.slice(8, 10));
  const shifted = month <= 2 ? year - 1 : year;
  const era = Math.floor(shifted / 400);
  const yearOfEra = shifted - era * 400;
  const dayOfYear = Math.floor((153 * (month > 2 ? month - 3 : month + 9) + 2) / 5) + day - 1;
  const dayOfEra =
    yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146097 + dayOfEra - 719468;
}

/** The civil date of a day number; the inverse of `dayNumber`. */
export function dateOfDay(day: number): string {
  const shifted = day + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36524) -
      Math.floor(dayOfEra / 146096)) /
      365,
  );
  const dayOfYear =
    dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthShifted = Math.floor((5 * dayOfYear + 2) / 153);
  const dayOfMonth = dayOfYear - Math.floor((153 * monthShifted + 2) / 5) + 1;
  const month = monthShifted < 10 ? monthShifted + 3 : monthShifted - 9;
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0);
  return `${pad(year, 4)}-${pad(month, 2)}-${pad(dayOfMonth, 2)}`;
}

/** Whether the text is a real date between the years 1000 and 9999. Asked several times of every job: no text is made. */
export function isDate(text: string): boolean {
  if (!DATE.test(text)) return false;
  const year = Number(text.slice(0, 4));
  const month = Number(text.slice(5, 7));
  const day = Number(text.slice(8, 10));
  return month >= 1 && month <= 12 && day >= 1 && day <= daysInMonth(year, month);
}

function daysInMonth(year: number, month: number): number {
  if (month === 2) return year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0) ? 29 : 28;
  return month === 4 || month === 6 || month === 9 || month === 11 ? 30 : 31;
}

/** Whether the text is a real month `YYYY-MM`. */
export function isMonth(text: string): boolean {
  return /^[1-9]\d{3}-(0[1-9]|1[0-2])$/.test(text);
}

/** The date `days` later (earlier when negative). */
export function addDays(date: string, days: number): string {
  return dateOfDay(dayNumber(date) + days);
}

/** Days from `from` to `to`; negative when `to` is earlier. */
export function daysBetween(from: string, to: string): number {
  return dayNumber(to) - dayNumber(from);
}

/** The date `months` calendar months later, its day clipped to the month's last (rule 16). */
export function addMonths(date: string, months: number): string {
  const index = Number(date.slice(0, 4)) * 12 + Number(date.slice(5, 7)) - 1 + months;
  const year = Math.floor(index / 12);
  const month = index - year * 12 + 1;
  const day = Math.min(Number(date.slice(8, 10)), daysInMonth(year, month));
  return `${pad(year, 4)}-${pad(month, 2)}-${pad(day, 2)}`;
}

/** The Monday on or before a date. */
export function mondayOf(date: string): string {
  return dateOfDay(mondayDay(dayNumber(date)));
}

function mondayDay(day: number): number {
  // 1970-01-01 was a Thursday: day −3 was a Monday.
  return day - ((((day + 3) % 7) + 7) % 7);
}

/** The ISO 8601 week of a date, `YYYY-Www`. Source: ISO 8601-1:2019, 3.1.1.23: week 1 holds the year's first Thursday. */
export function isoWeek(date: string): string {
  const thursday = mondayDay(dayNumber(date)) + 3;
  const year = Number(dateOfDay(thursday).slice(0, 4));
  const week = Math.floor((thursday - dayNumber(`${pad(year, 4)}-01-01`)) / 7) + 1;
  return `${pad(year, 4)}-W${pad(week, 2)}`;
}

/** The Monday of an ISO week. */
export function mondayOfWeek(week: string): string {
  const fourth = dayNumber(`${week.slice(0, 4)}-01-04`);
  return dateOfDay(mondayDay(fourth) + (Number(week.slice(6, 8)) - 1) * 7);
}

/** Every ISO week that touches the dates, oldest first (rule 54). */
export function weeksTouching(from: string, to: string): string[] {
  const weeks: string[] = [];
  for (let day = mondayDay(dayNumber(from)); day <= dayNumber(to); day += 7) {
    weeks.push(isoWeek(dateOfDay(day)));
  }
  return weeks;
}

/** Whether the text names a real ISO week. */
export function isWeek(text: string): boolean {
  return /^[1-9]\d{3}-W\d{2}$/.test(text) && isoWeek(mondayOfWeek(text)) === text;
}

/** Whole years of age: calendar months from registration to completion, divided by 12, rounded down (rule 31). */
export function ageInYears(firstRegistered: string, completedOn: string): number {
  const months =
    (Number(completedOn.slice(0, 4)) - Number(firstRegistered.slice(0, 4))) * 12 +
    Number(completedOn.slice(5, 7)) -
    Number(firstRegistered.slice(5, 7));
  return Math.floor(months / 12);
}

/** The age band of an age in whole years. */
export function ageBand(years: number): AgeBand {
  return AGE_BANDS[Math.min(4, Math.floor(Math.max(0, years) / 5))] as AgeBand;
}

const formats = new Map<string, Intl.DateTimeFormat>();

/** The local date of an instant in an IANA time zone. */
export function localDate(instant: Date, timeZone: string): string {
  let format = formats.get(timeZone);
  if (!format) {
    // Making a formatter costs more than a thousand uses of it.
    format = new Intl.DateTimeFormat('en-CA', {
      timeZone,
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
    });
    formats.set(timeZone, format);
  }
  return format.format(instant);
}

function pad(value: number, width: number): string {
  return String(value).padStart(width, '0');
}
