import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import { formatCount, formatNumber, formatShare, formatWeekNumber } from '../../ui/format';
import { spreadLabels } from '../spread-labels';
import { textWidth, widestText } from '../text-width';
import { marginAxis } from './margin-axis';
import { placeFlags, type Flag, type FlagWish } from './place-flags';
import { weekAxis, type AxisWord } from './week-axis';
import type { MarginMark, WeeklyMarginInput } from './weekly-margin-input';

/** A week with its place in the picture; `y` is null where nothing was billed. */
export interface PlacedWeek {
  readonly week: string;
  readonly x: number;
  readonly y: number | null;
  readonly mark: MarginMark;
  readonly chosen: boolean;
  readonly lines: readonly string[];
}

/** A label at the right end of a line. */
export interface EndLabel {
  readonly y: number;
  readonly value: string;
  readonly word: string;
  readonly role: 'limit' | 'chosen' | 'target';
}

/** Everything the weekly chart draws, in px of the picture. */
export interface WeeklyMarginLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  /** Room between two neighbouring weeks. */
  readonly pitch: number;
  readonly hairlines: readonly { readonly y: number; readonly text: string }[];
  readonly limits: {
    readonly upper: number;
    readonly centre: number;
    readonly lower: number;
  } | null;
  readonly target: number | null;
  readonly join: string;
  readonly weeks: readonly PlacedWeek[];
  readonly flags: readonly Flag[];
  readonly labels: readonly EndLabel[];
  readonly numbers: readonly AxisWord[];
  readonly years: readonly AxisWord[];
  readonly boundaries: readonly number[];
  /** "axis starts at 26 %", absent when it starts at 0. */
  readonly start: { readonly y: number; readonly text: string } | null;
}

const TOP = 10;
const PLOT_HEIGHT = 228;
const TEXT_ROW = 19;
const NARROW = 480;
const BETWEEN_LABELS = 19;

/** Lays out the weekly margin chart for a width in px. Pure: the same input and width give the same picture. */
export function layOutWeeklyMargin(input: WeeklyMarginInput, width: number): WeeklyMarginLayout {
  const axis = marginAxis(input);
  const bottom = TOP + PLOT_HEIGHT;
  const y = scaleLinear([axis.bottom, axis.top], [bottom, TOP]).clamp(true);
  const yOf = (share: number): number => y(share * 100);

  const words = endWords(input, width < NARROW);
  const left = widestText(axis.ticks.map(formatCount)) + 10;
  const gutter = words.reduce((most, { value, word }) => Math.max(most, endWidth(value, word)), 0);
  const right = Math.max(left + 60, width - (gutter > 0 ? gutter + 11 : 8));

  const inset = Math.min(14, (right - left) / (2 * Math.max(input.points.length, 1)));
  const pitch =
    input.points.length > 1 ? (right - left - 2 * inset) / (input.points.length - 1) : right - left;
  const xOf = (index: number): number => left + inset + index * pitch;

  const weeks = input.points.map((point, index): PlacedWeek => ({
    week: point.week,
    x: xOf(index),
    y: point.share === null ? null : yOf(point.share),
    mark: point.mark,
    chosen: point.week === input.chosen,
    lines: point.lines,
  }));
  const drawn = weeks.flatMap(({ x, y }) => (y === null ? [] : [{ x, y }]));
  const spread = spreadLabels(
    words.map(({ share }) => yOf(share)),
    BETWEEN_LABELS,
  );
  const weekWords = weekAxis(
    input.points.map(({ week }) => week),
    xOf,
    pitch,
    left,
  );
  const start = startNote(axis.bottom, weekWords.years, left, bottom);

  return {
    width,
    height: (start?.y ?? bottom + 2 * TEXT_ROW) + 8,
    left,
    right,
    top: TOP,
    bottom,
    pitch,
    hairlines: axis.ticks.map((tick) => ({ y: y(tick), text: formatCount(tick) })),
    limits: input.limits && {
      upper: yOf(input.limits.upper),
      centre: yOf(input.limits.centre),
      lower: yOf(input.limits.lower),
    },
    target: input.target === null ? null : yOf(input.target),
    join: join(weeks),
    weeks,
    flags: placeFlags(
      wishes(input, weeks),
      drawn,
      { left, right, top: TOP - 10, bottom },
      levels(input).map(yOf),
    ),
    labels: words.map(({ value, word, role }, index) => ({ y: spread[index]!, value, word, role })),
    ...weekWords,
    start,
  };
}

/** Shares at which a line runs across the plot. */
function levels({ limits, target }: WeeklyMarginInput): number[] {
  return [
    ...(limits ? [limits.upper, limits.centre, limits.lower] : []),
    ...(target === null ? [] : [target]),
  ];
}

interface EndWord extends Omit<EndLabel, 'y'> {
  readonly share: number;
}

function endWords(input: WeeklyMarginInput, narrow: boolean): EndWord[] {
  const words: EndWord[] = [];
  const add = (share: number, word: string, role: EndLabel['role']): void => {
    words.push({ share, value: formatCount(share * 100), word, role });
  };
  if (input.limits) {
    add(input.limits.upper, narrow ? 'upper' : 'upper limit', 'limit');
    add(input.limits.centre, 'centre', 'limit');
    add(input.limits.lower, narrow ? 'lower' : 'lower limit', 'limit');
  }
  // A target has the digits that it was given, half a per cent too.
  if (input.target !== null) {
    const percent = Number((input.target * 100).toFixed(2));
    const value = formatNumber(percent, String(percent).split('.')[1]?.length ?? 0);
    words.push({ share: input.target, value, word: 'target', role: 'target' });
  }
  const chosen = input.points.find(({ week }) => week === input.chosen);
  if (chosen && chosen.share !== null) {
    add(chosen.share, formatWeekNumber(chosen.week), 'chosen');
  }
  return words;
}

function endWidth(value: string, word: string): number {
  return textWidth(value, 600) + textWidth(' ') + textWidth(word, 600);
}

function join(weeks: readonly PlacedWeek[]): string {
  const path = line<PlacedWeek>(
    ({ x }) => x,
    ({ y }) => y ?? 0,
  ).defined(({ y, mark }) => y !== null && mark !== 'partial');
  return path(weeks) ?? '';
}

/** Sentences in the order in which they give way: those of runs, of which there are few, choose their place first. */
function wishes(input: WeeklyMarginInput, weeks: readonly PlacedWeek[]): FlagWish[] {
  const ofRun = ({ mark }: PlacedWeek): boolean => mark === 'run_low' || mark === 'run_high';
  return input.points
    .flatMap(({ flag }, index) => {
      const week = weeks[index]!;
      return flag === null || week.y === null
        ? []
        : [{ x: week.x, y: week.y, text: flag, must: ofRun(week) }];
    })
    .sort((a, b) => Number(a.must) - Number(b.must));
}

function startNote(
  start: number,
  years: readonly AxisWord[],
  left: number,
  bottom: number,
): WeeklyMarginLayout['start'] {
  if (start === 0) return null;
  const text = `axis starts at ${formatShare(start / 100)}`;
  const end = left + textWidth(text) + 16;
  const room = years.every(({ x, text: year, anchor }) => {
    return (anchor === 'end' ? x - textWidth(year) : x) >= end;
  });
  return { y: bottom + (room ? 2 : 3) * TEXT_ROW, text };
}
