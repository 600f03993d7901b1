import { widestText } from './text-width';
import { valueAxis, type ValueAxis } from './value-axis';

const HEAD = 30;
const ROW = 34;
const STACKED_ROW = 52;
const LINE = 20;
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
  /** How far a log axis goes to either side of the reference, in times of it. */
  readonly reach?: number;
  /** `below`: where a row's words leave no room beside them, its cars stand on a line of their own. */
  readonly counts?: 'beside' | 'below';
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
  /** Middle of the line on which its cars stand, the words' own unless they take up all of it. */
  readonly countY: number;
  /** Middle of what is drawn. */
  readonly y: number;
}

/**
 * Lays out rows of name, cars, plot and value over one axis. Where that leaves the plot less than 130 px, each plot moves
 * under its words; where even those do not fit on one line, the cars may move under the name. Pure.
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
    input.reach,
  );
  const apart = input.counts === 'below' && labels + counts + readouts + 2 * GAP > width;
  const more = apart ? LINE : 0;
  const pitch = stacked ? STACKED_ROW + more : ROW;
  const bottom = HEAD + rows.length * pitch;
  const places = rows.map((_row, index) => {
    const top = HEAD + index * pitch;
    const wordY = top + (stacked ? 14 : ROW / 2);
    return { wordY, countY: wordY + more, y: top + (stacked ? 36 + more : ROW / 2) };
  });
  const frame = {
    width,
    height: bottom + 4,
    left,
    right,
    countX: stacked ? (apart ? counts : labels + GAP + counts) : left - GAP,
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
