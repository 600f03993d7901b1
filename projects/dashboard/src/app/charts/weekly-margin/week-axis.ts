import { textWidth } from '../text-width';

/** A word on the week axis; `anchor` as in SVG. */
export interface AxisWord {
  readonly x: number;
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
}

/** Week numbers under the axis, and the years below them with a hairline where one year ends. */
export interface WeekAxis {
  readonly numbers: readonly AxisWord[];
  readonly years: readonly AxisWord[];
  readonly boundaries: readonly number[];
}

const INTERVALS = [1, 2, 4, 8, 13, 26] as const;
const LEAST_BETWEEN_NUMBERS = 52;
const GAP = 8;

/**
 * Names the weeks: numbers at every first, second, fourth, 8th, 13th or 26th week of the calendar, as the room between two weeks
 * (`pitch`, px) allows; years as "weeks of 2025 | 2026".
 */
export function weekAxis(
  weeks: readonly string[],
  xOf: (index: number) => number,
  pitch: number,
  left: number,
): WeekAxis {
  const every = INTERVALS.find((interval) => interval * pitch >= LEAST_BETWEEN_NUMBERS) ?? 26;
  const numbers = weeks.flatMap((week, index): AxisWord[] => {
    const number = Number(week.slice(6));
    if (number % every !== 0) return [];
    return [{ x: xOf(index), text: String(number), anchor: 'middle' }];
  });
  return { numbers, ...years(weeks, xOf, pitch, left) };
}

function years(
  weeks: readonly string[],
  xOf: (index: number) => number,
  pitch: number,
  left: number,
): Pick<WeekAxis, 'years' | 'boundaries'> {
  const starts = weeks.flatMap((week, index) =>
    index > 0 && week.slice(0, 4) !== weeks[index - 1]!.slice(0, 4) ? [index] : [],
  );
  const first = weeks[0];
  if (!first) return { years: [], boundaries: [] };
  const boundaries = starts.map((index) => xOf(index) - pitch / 2);
  if (boundaries.length === 0) {
    const text = `weeks of ${first.slice(0, 4)}`;
    return { years: [{ x: xOf(weeks.length - 1), text, anchor: 'end' }], boundaries };
  }
  const before = `weeks of ${first.slice(0, 4)}`;
  const fits = boundaries[0]! - left >= textWidth(before) + GAP;
  const words: AxisWord[] = fits ? [{ x: boundaries[0]! - GAP, text: before, anchor: 'end' }] : [];
  starts.forEach((index, position) => {
    const year = weeks[index]!.slice(0, 4);
    const text = words.length === 0 ? `weeks of ${year}` : year;
    words.push({ x: boundaries[position]! + GAP, text, anchor: 'start' });
  });
  return { years: words, boundaries };
}
