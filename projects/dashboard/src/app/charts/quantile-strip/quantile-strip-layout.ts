import { layOutRowFrame, type RowFrame, type RowPlace } from '../row-frame';
import type { QuantileStripInput } from './quantile-strip-input';

/** A group with its place in the picture, px. */
export interface PlacedStrip extends RowPlace {
  readonly key: string;
  readonly label: string;
  readonly count: string;
  readonly text: string;
  readonly chosen: boolean;
  /** Null where there are too few cars. */
  readonly strip: { readonly median: number; readonly p80: number; readonly p95: number } | null;
  /** Whether the last twentieth lies beyond the axis. */
  readonly beyond: boolean;
}

/** Everything the chart draws, in px of the picture. */
export interface QuantileStripLayout extends RowFrame {
  readonly rows: readonly PlacedStrip[];
}

/** Lays out spreads by group: name, cars, strip, value. Pure. */
export function layOutQuantileStrip(input: QuantileStripInput, width: number): QuantileStripLayout {
  const { rows } = input;
  const { frame, axis, places } = layOutRowFrame(
    {
      ...input,
      readouts: rows.map(({ text, p80 }) => (p80 === null ? '' : text)),
      values: rows
        .flatMap(({ median, p80, p95 }) => [median, p80, p95])
        .filter((value) => value !== null),
    },
    width,
  );
  return {
    ...frame,
    rows: places.map((place, index) => {
      const { key, label, count, text, chosen, median, p80, p95 } = rows[index]!;
      return {
        ...{ key, label, count, text, chosen },
        ...place,
        strip:
          median === null || p80 === null || p95 === null
            ? null
            : { median: axis.place(median), p80: axis.place(p80), p95: axis.place(p95) },
        beyond: p95 !== null && axis.beyond(p95) === 'right',
      };
    }),
  };
}
