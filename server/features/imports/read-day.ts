import type { ReadingOptions } from '#shared/contracts/imports';
import { isDate, isMonth } from '#shared/domain/calendar';

const TIME = '(?:[T ]\\s*\\d{1,2}:\\d{2}(?::\\d{2}(?:\\.\\d+)?)?Z?)?';
const YEAR_FIRST = new RegExp(`^(\\d{4})[-/.](\\d{1,2})[-/.](\\d{1,2})${TIME}$`);
const THREE_PARTS = new RegExp(`^(\\d{1,2})[-/.]\\s?(\\d{1,2})[-/.]\\s?(\\d{4}|\\d{2})${TIME}$`);
const MONTH = /^(?:(\d{4})[-/.](\d{1,2})|(\d{1,2})[-/.](\d{4}))$/;

type Order = ReadingOptions['dateOrder'];

/**
 * Reads a day. One that begins with a year of four digits is read so whatever the order; a year of two digits is the latest
 * that has begun, because nothing that is recorded lies in the future. A time of day is passed over.
 */
export function readDay(text: string, order: Order, today: string): string | undefined {
  const first = YEAR_FIRST.exec(text);
  if (first) return dayOf(first[1], first[2], first[3]);
  const parts = THREE_PARTS.exec(text);
  if (!parts) return undefined;
  const [, a, b, c = ''] = parts;
  if (order === 'ymd') return c.length === 2 ? dayOf(fullYear(a, today), b, c) : undefined;
  const year = fullYear(c, today);
  return order === 'dmy' ? dayOf(year, b, a) : dayOf(year, a, b);
}

/** Reads a month, or the month of a day. */
export function readMonth(text: string, order: Order, today: string): string | undefined {
  const match = MONTH.exec(text);
  if (!match) return readDay(text, order, today)?.slice(0, 7);
  const month = `${match[1] ?? match[4]}-${padded(match[2] ?? match[3])}`;
  return isMonth(month) ? month : undefined;
}

/** How a day of that order is written, for a person. */
export const WRITTEN: Record<Order, string> = {
  ymd: 'year-month-day, such as 2026-01-28',
  dmy: 'day.month.year, such as 28.01.2026',
  mdy: 'month/day/year, such as 01/28/2026',
};

function dayOf(year?: string, month?: string, day?: string): string | undefined {
  const date = `${year}-${padded(month)}-${padded(day)}`;
  return isDate(date) ? date : undefined;
}

function fullYear(year = '', today: string): string {
  if (year.length === 4) return year;
  const century = Number(today.slice(0, 2));
  const two = year.padStart(2, '0');
  return two <= today.slice(2, 4) ? `${century}${two}` : `${century - 1}${two}`;
}

function padded(part = ''): string {
  return part.padStart(2, '0');
}
