import { widestText } from '../text-width';
import { valueAxis, type ValueAxis } from '../value-axis';
import type { QuantileStripInput } from './quantile-strip-input';

/** A group with its place in the picture, px. */
export interface PlacedStrip {
  readonly key: string;
  readonly label: string;
  readonly count: string;
  readonly text: string;
  readonly chosen: boolean;
  readonly wordY: number;
  readonly y: number;
  /** Null where there are too few cars. */
  readonly strip: { readonly median: number; readonly p80: number; readonly p95: number } | null;
  /** Whether the last twentieth lies beyond the axis. */
  readonly beyond: boolean;
}

/** Everything the chart draws, in px of the picture. */
export interface QuantileStripLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly countX: number;
  readonly head: number;
  readonly bottom: number;
  readonly reference: number;
  readonly marks: ValueAxis['marks'];
  /** Heights between which the lines of marks run: all through, or beside words that stand over each plot not. */
  readonly guides: readonly { readonly from: number; readonly to: number }[];
  readonly rows: readonly PlacedStrip[];
}

const HEAD = 30;
const ROW = 34;
const STACKED_ROW = 52;
const LEAST_PLOT = 130;
const GAP = 16;

/** Lays out spreads by group: name, cars, strip, value; under 130 px of strip each moves under its words. Pure. */
export function layOutQuantileStrip(input: QuantileStripInput, width: number): QuantileStripLayout {
  const { rows } = input;
  const labels = widestText(
    rows.map(({ label }) => label),
    600,
  );
  const counts = widestText(rows.map(({ count }) => count));
  const values = widestText(
    rows.map(({ text, p80 }) => (p80 === null ? '' : text)),
    600,
  );
  const stacked = width - labels - counts - values - 3 * GAP < LEAST_PLOT;
  const left = stacked ? 6 : labels + counts + 2 * GAP;
  const right = stacked ? width - 6 : width - values - GAP;
  const axis = valueAxis(
    input.scale,
    rows.flatMap(({ median, p80, p95 }) => [median, p80, p95].filter((v) => v !== null)),
    input.reference,
    input.marks,
    left,
    right,
    width,
  );
  const pitch = stacked ? STACKED_ROW : ROW;
  const bottom = HEAD + rows.length * pitch;
  const placed = rows.map(
    ({ key, label, count, text, chosen, median, p80, p95 }, index): PlacedStrip => {
      const top = HEAD + index * pitch;
      return {
        ...{ key, label, count, text, chosen },
        wordY: top + (stacked ? 14 : ROW / 2),
        y: top + (stacked ? 36 : ROW / 2),
        strip:
          median === null || p80 === null || p95 === null
            ? null
            : { median: axis.place(median), p80: axis.place(p80), p95: axis.place(p95) },
        beyond: p95 !== null && axis.beyond(p95) === 'right',
      };
    },
  );
  return {
    width,
    height: bottom + 4,
    left,
    right,
    countX: stacked ? labels + GAP + counts : left - GAP,
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
