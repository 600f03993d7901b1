import { textWidth, widestText } from '../text-width';
import { valueAxis, type ValueAxis } from '../value-axis';
import type { DotIntervalInput, IntervalRow, Stand } from './dot-interval-input';

/** A group with its place in the picture, px. */
export interface PlacedInterval {
  readonly key: string;
  readonly label: string;
  readonly count: string;
  readonly text: string;
  readonly word: string;
  readonly stand: Stand;
  readonly chosen: boolean;
  /** Middle of the line of words. */
  readonly wordY: number;
  /** Middle of dot and interval. */
  readonly y: number;
  /** Null where there are too few cars. */
  readonly dot: { readonly x: number; readonly from: number; readonly to: number } | null;
  /** The end of the axis that the interval runs beyond, marked by an arrow head. */
  readonly beyond: 'left' | 'right' | null;
}

/** Everything the chart draws, in px of the picture. */
export interface DotIntervalLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly countX: number;
  readonly stacked: boolean;
  readonly head: number;
  readonly bottom: number;
  readonly reference: number;
  readonly marks: ValueAxis['marks'];
  /** Heights between which the lines of marks run: all through, or beside words that stand over each plot not. */
  readonly guides: readonly { readonly from: number; readonly to: number }[];
  readonly rows: readonly PlacedInterval[];
}

const HEAD = 30;
const ROW = 34;
const STACKED_ROW = 52;
const LEAST_PLOT = 130;
const GAP = 16;
const BEFORE_ARROW = 16;

/**
 * Lays out groups as dots with intervals: name, cars, plot, value. Where that leaves the plot less than 130 px, each plot moves
 * under its words. Pure.
 */
export function layOutDotInterval(input: DotIntervalInput, width: number): DotIntervalLayout {
  const { rows } = input;
  const labels = widestText(
    rows.map(({ label }) => label),
    600,
  );
  const counts = widestText(rows.map(({ count }) => count));
  const values = widestText(rows.map(readout), 600);
  const stacked = width - labels - counts - values - 3 * GAP < LEAST_PLOT;
  const left = stacked ? 6 : labels + counts + 2 * GAP;
  const right = stacked ? width - 6 : width - values - GAP;
  const axis = valueAxis(
    input.scale,
    rows.flatMap(({ value, lower, upper }) => [value, lower, upper].filter((v) => v !== null)),
    input.reference,
    input.marks,
    left,
    right,
    width,
  );
  const pitch = stacked ? STACKED_ROW : ROW;
  const placed = rows.map((row, index) => {
    const top = HEAD + index * pitch;
    return placeRow(row, axis, top + (stacked ? 14 : ROW / 2), top + (stacked ? 36 : ROW / 2));
  });
  const bottom = HEAD + rows.length * pitch;
  return {
    width,
    height: bottom + 4,
    left,
    right,
    countX: stacked ? labels + GAP + counts : left - GAP,
    stacked,
    head: HEAD,
    bottom,
    reference: axis.place(input.reference),
    marks: axis.marks,
    guides: stacked
      ? placed.map(({ y }) => ({ from: y - 12, to: y + 10 }))
      : [{ from: HEAD - 8, to: bottom }],
    rows: placed,
  };
}

function placeRow(row: IntervalRow, axis: ValueAxis, wordY: number, y: number): PlacedInterval {
  const { key, label, count, text, word, stand, chosen, value } = row;
  const lower = row.lower ?? value;
  const upper = row.upper ?? value;
  const beyond =
    value === null ? null : (axis.beyond(upper ?? value) ?? axis.beyond(lower ?? value));
  return {
    ...{ key, label, count, text, word, stand, chosen, wordY, y, beyond },
    dot:
      value === null
        ? null
        : {
            x: dotPlace(value, axis),
            from: axis.place(lower ?? value),
            to: axis.place(upper ?? value),
          },
  };
}

/** A dot beyond the axis stands inside its end, so that the arrow head beside it is seen. */
function dotPlace(value: number, axis: ValueAxis): number {
  const end = axis.beyond(value);
  return axis.place(value) + (end === null ? 0 : end === 'right' ? -BEFORE_ARROW : BEFORE_ARROW);
}

/** What stands in the value column: the value and, when the reference is missed, its word. */
function readout({ text, word, value }: IntervalRow): string {
  return value === null || word === '' ? (value === null ? '' : text) : `${text} ${word}`;
}

/** Width of the words that stand on the hatching of a row with too few cars. */
export function hatchWords(text: string): number {
  return textWidth(text) + 12;
}
