import { layOutRowFrame, type RowFrame, type RowPlace } from '../row-frame';
import type { BarWhiskerInput, BarWhiskerRow } from './bar-whisker-input';

/** A bar with its place in the picture, px. */
export interface PlacedBar
  extends RowPlace, Pick<BarWhiskerRow, 'key' | 'label' | 'text' | 'chosen'> {
  /** Null where nothing is known. */
  readonly bar: { readonly end: number; readonly further: number } | null;
}

/** Everything the chart draws, in px of the picture. */
export interface BarWhiskerLayout extends RowFrame {
  readonly rows: readonly PlacedBar[];
}

/** Lays out bars with whiskers: name, plot, value. Pure. */
export function layOutBarWhisker(
  { rows, marks }: BarWhiskerInput,
  width: number,
): BarWhiskerLayout {
  const { frame, axis, places } = layOutRowFrame(
    {
      rows: rows.map(({ label }) => ({ label, count: '' })),
      readouts: rows.map(({ text }) => text),
      values: rows.flatMap(({ value, further }) => [value, further]).filter((one) => one !== null),
      scale: 'linear',
      reference: 0,
      marks,
    },
    width,
  );
  return {
    ...frame,
    rows: places.map((place, index) => {
      const { key, label, text, chosen, value, further } = rows[index]!;
      return {
        ...{ key, label, text, chosen },
        ...place,
        bar:
          value === null ? null : { end: axis.place(value), further: axis.place(further ?? value) },
      };
    }),
  };
}
