import { widestText } from './text-width';
import { valueAxis, type ValueAxis } from './value-axis';

const HEAD = 30;
const ROW = 34;
const STACKED_ROW = 52;
const LEAST_PLOT = 130;
const GAP = 16;

/** What a picture of groups, one a row, has to make room for. */
export interface RowFrameInput {
  readonly rows: readonly { readonly label: string; readonly count: string }[];
  /** What stands in the value column of each row, or nothing. */
  readonly readouts: readonly string[];
  /** Every value that the axis should hold. */
  readonly values: readonly number[];
  readonly scale: Parameters<typeof valueAxis>[0];
  readonly reference: number;
  readonly marks: Parameters<typeof valueAxis>[3];
}

/** The parts that pictures of groups share, in px of the picture. */
export interface RowFrame {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly countX: number;
  /** Whether each plot stands under its words. */
  readonly stacked: boolean;
  readonly head: number;
  readonly bottom: number;
  readonly reference: number;
  readonly marks: ValueAxis['marks'];
  /** Heights between which the lines of marks run: all through, or beside words that stand over each plot not. */
  readonly guides: readonly { readonly from: number; readonly to: number }[];
}

/** Where a row's words and its mark stand. */
export interface RowPlace {
  /** Middle of the line of words. */
  readonly wordY: number;
  /** Middle of what is drawn. */
  readonly y: number;
}

/**
 * Lays out rows of name, cars, plot and value over one axis. Where that leaves the plot less than 130 px, each plot moves
 * under its words. Pure.
 */
export function layOutRowFrame(
  input: RowFrameInput,
  width: number,
): { frame: RowFrame; axis: ValueAxis; places: readonly RowPlace[] } {
  const { rows } = input;
  const labels = widestText(
    rows.map(({ label }) => label),
    600,
  );
  const counts = widestText(rows.map(({ count }) => count));
  const readouts = widestText(input.readouts, 600);
  const stacked = width - labels - counts - readouts - 3 * GAP < LEAST_PLOT;
  const left = stacked ? 6 : labels + counts + 2 * GAP;
  const right = stacked ? width - 6 : width - readouts - GAP;
  const axis = valueAxis(
    input.scale,
    [...input.values],
    input.reference,
    input.marks,
    left,
    right,
    width,
  );
  const pitch = stacked ? STACKED_ROW : ROW;
  const bottom = HEAD + rows.length * pitch;
  const places = rows.map((_row, index) => {
    const top = HEAD + index * pitch;
    return { wordY: top + (stacked ? 14 : ROW / 2), y: top + (stacked ? 36 : ROW / 2) };
  });
  const frame = {
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
      ? places.map(({ y }) => ({ from: y - 12, to: y + 10 }))
      : [{ from: HEAD - 8, to: bottom }],
  };
  return { frame, axis, places };
}
