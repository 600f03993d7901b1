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
  readonly marks: readonly { readonly x: number; readonly text: string; readonly value: number }[];
}

/** The most a log axis spans to either side of the reference: a far group may not flatten the rest. */
const LOG_REACH = 6;
const PAD = 0.06;
const BETWEEN_WORDS = 12;

/**
 * Builds the axis of a group chart over `values`, the reference always on it. A log axis takes positive values and reaches at most
 * six times the reference either way; what lies further is drawn at its end. Words that would touch are left out, the reference's
 * never.
 */
export function valueAxis(
  scale: 'linear' | 'log',
  values: readonly number[],
  reference: number,
  offered: readonly AxisMark[],
  left: number,
  right: number,
): ValueAxis {
  const usable = scale === 'log' ? values.filter((value) => value > 0) : values;
  let low = Math.min(reference, ...usable);
  let high = Math.max(reference, ...usable);
  if (scale === 'log') {
    low = Math.max(low, reference / LOG_REACH) / 1.06;
    high = Math.min(high, reference * LOG_REACH) * 1.06;
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
    marks: readableMarks(offered, reference, low, high, place),
  };
}

function readableMarks(
  offered: readonly AxisMark[],
  reference: number,
  low: number,
  high: number,
  place: (value: number) => number,
): ValueAxis['marks'] {
  const order = offered
    .filter(({ value }) => value >= low && value <= high)
    .sort((a, b) => Number(b.value === reference) - Number(a.value === reference));
  const kept: { x: number; text: string; value: number; half: number }[] = [];
  for (const { value, text } of order) {
    const mark = { x: place(value), text, value, half: textWidth(text) / 2 };
    const clear = kept.every(
      (other) => Math.abs(other.x - mark.x) >= other.half + mark.half + BETWEEN_WORDS,
    );
    if (clear) kept.push(mark);
  }
  return kept.sort((a, b) => a.x - b.x).map(({ x, text, value }) => ({ x, text, value }));
}
