import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import { textWidth, widestText } from '../text-width';
import type { StripMark, WeekStripInput } from './week-strip-input';

/** Everything a small picture of weeks draws, px. */
export interface WeekStripLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly ticks: readonly { readonly y: number; readonly text: string }[];
  readonly usual: {
    readonly upper: number;
    readonly centre: number;
    readonly lower: number;
  } | null;
  /** Its line; the word stands at its right end. */
  readonly target: number | null;
  readonly join: string;
  /** Weeks that are marked. */
  readonly marks: readonly { readonly x: number; readonly y: number; readonly mark: StripMark }[];
  readonly last: { readonly x: number; readonly y: number } | null;
  readonly bars: readonly { readonly x: number; readonly y: number; readonly height: number }[];
  readonly barWidth: number;
}

const TOP = 10;
const PLOT = 84;

/** Lays out one branch's weeks for a width in px. Pure: the same input and width give the same picture. */
export function layOutWeekStrip(input: WeekStripInput, width: number): WeekStripLayout {
  const bottom = TOP + PLOT;
  const y = scaleLinear(input.scale, [bottom, TOP]).clamp(true);
  const left = widestText(input.ticks.map(({ text }) => text)) + 8;
  const right = Math.max(left + 40, width - (input.target === null ? 8 : textWidth('target') + 7));
  const pitch = (right - left) / Math.max(1, input.weeks.length);
  const weeks = input.weeks.map(({ value, mark }, index) => ({
    x: left + (index + 0.5) * pitch,
    value,
    y: value === null ? 0 : y(value),
    mark,
  }));
  const known = weeks.filter(({ value }) => value !== null);
  const last = input.look === 'line' ? known.at(-1) : undefined;
  const path = line<(typeof weeks)[number]>(
    (week) => week.x,
    (week) => week.y,
  ).defined(({ value }) => value !== null);
  const target = input.target === null ? null : y(input.target);
  return {
    width,
    height: bottom + 6,
    left,
    right,
    bottom,
    ticks: input.ticks.map(({ value, text }) => ({ y: y(value), text })),
    usual: input.usual && {
      upper: y(input.usual.upper),
      centre: y(input.usual.centre),
      lower: y(input.usual.lower),
    },
    target,
    join: input.look === 'line' ? (path(weeks) ?? '') : '',
    marks: input.look === 'line' ? known.filter(({ mark }) => mark !== 'plain') : [],
    last: last ? { x: last.x, y: last.y } : null,
    bars:
      input.look === 'bars'
        ? known
            .filter(({ value }) => (value ?? 0) > 0)
            .map(({ x, y: top }) => ({ x, y: top, height: bottom - top }))
        : [],
    barWidth: Math.max(1.5, Math.min(6, pitch - 1)),
  };
}
