import { layOutRowFrame, type RowFrame, type RowPlace } from '../row-frame';
import type { ValueAxis } from '../value-axis';
import type { DotIntervalInput, IntervalRow, Stand } from './dot-interval-input';

/** A group with its place in the picture, px. */
export interface PlacedInterval extends RowPlace {
  readonly key: string;
  readonly label: string;
  readonly count: string;
  readonly text: string;
  readonly word: string;
  readonly stand: Stand;
  readonly chosen: boolean;
  /** Null where there are too few cars. */
  readonly dot: { readonly x: number; readonly from: number; readonly to: number } | null;
  /** The end of the axis that the interval runs beyond, marked by an arrow head. */
  readonly beyond: 'left' | 'right' | null;
  /** Where its own reference lies; null for none. */
  readonly tick: number | null;
}

/** Everything the chart draws, in px of the picture. */
export interface DotIntervalLayout extends Omit<RowFrame, 'reference'> {
  readonly reference: number | null;
  readonly look: 'plain' | 'ledger';
  /** Heights of the hairlines between rows. */
  readonly rules: readonly number[];
  readonly rows: readonly PlacedInterval[];
}

const BEFORE_ARROW = 16;

/** Lays out groups as dots with intervals: name, cars, plot, value. Pure. */
export function layOutDotInterval(input: DotIntervalInput, width: number): DotIntervalLayout {
  const { rows } = input;
  const { frame, axis, places } = layOutRowFrame(
    {
      ...input,
      reference: input.reference ?? middleOf(rows),
      counts: 'below',
      readouts: rows.map(readout),
      values: rows
        .flatMap(({ value, lower, upper, tick }) => [value, lower, upper, tick ?? null])
        .filter((value) => value !== null),
    },
    width,
  );
  const look = input.look ?? 'plain';
  const pitch = (frame.bottom - frame.head) / Math.max(1, rows.length);
  return {
    ...frame,
    reference: input.reference === null ? null : frame.reference,
    look,
    rules:
      look === 'plain' ? [] : rows.slice(1).map((_row, index) => frame.head + (index + 1) * pitch),
    rows: places.map((place, index) => placeRow(rows[index]!, axis, place)),
  };
}

function placeRow(row: IntervalRow, axis: ValueAxis, place: RowPlace): PlacedInterval {
  const { key, label, count, text, word, stand, chosen, value } = row;
  const lower = row.lower ?? value;
  const upper = row.upper ?? value;
  const beyond =
    value === null ? null : (axis.beyond(upper ?? value) ?? axis.beyond(lower ?? value));
  return {
    ...{ key, label, count, text, word, stand, chosen, beyond },
    ...place,
    tick: row.tick === undefined || row.tick === null ? null : axis.place(row.tick),
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

/** A place inside the axis for what needs one where rows share no reference: any value drawn. */
function middleOf(rows: readonly IntervalRow[]): number {
  return rows.flatMap(({ value, tick }) => [value, tick ?? null]).find((one) => one !== null) ?? 0;
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
