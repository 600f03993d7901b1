import { scaleLinear, scaleLog } from 'd3-scale';
import { textWidth } from './text-width';

/** A mark on a value axis with its words ("twice"). */
export interface AxisMark {
  readonly value: number;
  readonly text: string;
}

/** A value axis in px: where a value stands, what lies beyond its ends, and the marks with their words. */
export interface ValueAxis {
  /** Place of a value, at the end of the axis when it lies beyond. */
  place(value: number): number;
  /** Whether a value lies beyond an end. */
  beyond(value: number): 'left' | 'right' | null;
  readonly marks: readonly PlacedMark[];
}

/** A mark on the axis; its words may stand a little beside it to stay inside the picture. */
export interface PlacedMark {
  readonly x: number;
  readonly wordX: number;
  readonly text: string;
  readonly value: number;
}

/** The most a log axis spans to either side of the reference unless told: a far group may not flatten the rest. */
const LOG_REACH = 3;
const PAD = 0.06;
const BETWEEN_WORDS = 12;

/**
 * Builds the axis of a group chart over `values`, the reference always on it. A log axis takes positive values and reaches at most
 * `reach` times the reference either way; what lies further is drawn at its end. Words that would touch are left out, the reference's
 * never. Words stay within `width`, the picture’s.
 */
export function valueAxis(
  scale: 'linear' | 'log',
  values: readonly number[],
  reference: number,
  offered: readonly AxisMark[],
  left: number,
  right: number,
  width: number = right,
  reach: number = LOG_REACH,
): ValueAxis {
  const usable = scale === 'log' ? values.filter((value) => value > 0) : values;
  let low = Math.min(reference, ...usable);
  let high = Math.max(reference, ...usable);
  if (scale === 'log') {
    low = Math.max(low, reference / reach) / 1.06;
    high = Math.min(high, reference * reach) * 1.06;
  } else {
    const pad = (high - low || 1) * PAD;
    low -= pad;
    high += pad;
  }
  const x = (scale === 'log' ? scaleLog() : scaleLinear()).domain([low, high]).range([left, right]);
  const place = (value: number): number => {
    if (scale === 'log' && value <= 0) return left;
    return Math.min(right, Math.max(left, x(value)));
  };
  return {
    place,
    beyond: (value) => (value < low ? 'left' : value > high ? 'right' : null),
    marks: readableMarks(offered, reference, [low, high], place, width),
  };
}

function readableMarks(
  offered: readonly AxisMark[],
  reference: number,
  [low, high]: readonly [number, number],
  place: (value: number) => number,
  width: number,
): PlacedMark[] {
  const order = offered
    .filter(({ value }) => value >= low && value <= high)
    .sort((a, b) => Number(b.value === reference) - Number(a.value === reference));
  const kept: (PlacedMark & { half: number })[] = [];
  for (const { value, text } of order) {
    const half = textWidth(text) / 2;
    const x = place(value);
    const mark = { x, wordX: Math.max(half, Math.min(width - half, x)), text, value, half };
    const clear = kept.every(
      (other) => Math.abs(other.wordX - mark.wordX) >= other.half + half + BETWEEN_WORDS,
    );
    if (clear) kept.push(mark);
  }
  return kept
    .sort((a, b) => a.x - b.x)
    .map(({ x, wordX, text, value }) => ({ x, wordX, text, value }));
}
