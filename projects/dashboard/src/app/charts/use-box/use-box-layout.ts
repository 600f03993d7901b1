import { widestText } from '../text-width';
import { valueAxis, type ValueAxis } from '../value-axis';
import type { Spread, UseBoxInput, UseBoxRow } from './use-box-input';

const HEAD = 30;
const HEADING = 30;
const ROW = 26;
const STACKED_ROW = 50;
const LEAST_PLOT = 170;
const GAP = 14;
const NORM = 1;

/** A kind of car with its place in the picture, px. */
export interface PlacedBox extends Omit<UseBoxRow, 'spread'> {
  /** Middle of the line of words. */
  readonly wordY: number;
  /** Middle of what is drawn. */
  readonly y: number;
  /** Null where there are too few cars. */
  readonly box: Spread | null;
  /** Ends of the axis that the whisker runs beyond. */
  readonly beyond: { readonly left: boolean; readonly right: boolean };
}

/** Everything the chart draws, in px of the picture. */
export interface UseBoxLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly countX: number;
  /** Right ends of the words under and over. */
  readonly underX: number;
  readonly stacked: boolean;
  readonly norm: number;
  readonly marks: ValueAxis['marks'];
  readonly headings: readonly {
    readonly key: string;
    readonly label: string;
    readonly y: number;
  }[];
  readonly rows: readonly PlacedBox[];
  /** Heights between which the lines of marks run, one a group; one a row where words stand over each plot. */
  readonly guides: readonly { readonly from: number; readonly to: number }[];
}

/** Lays out spreads by kind of car over one axis of shares of the norm. Pure. */
export function layOutUseBox(input: UseBoxInput, width: number): UseBoxLayout {
  const all = input.groups.flatMap(({ rows }) => rows);
  const labels = Math.max(
    widestText(all.map(({ label }) => label)),
    widestText(
      input.groups.map(({ label }) => label),
      600,
    ),
  );
  const counts = widestText(['cars', ...all.map(({ count }) => count)]);
  const under = widestText(
    all.map((row) => row.under),
    600,
  );
  const over = widestText(all.map((row) => row.over));
  const readouts = under + over + (under > 0 ? GAP : 0) + (over > 0 ? GAP : 0);
  const stacked = width - labels - counts - readouts - 2 * GAP < LEAST_PLOT;
  const left = stacked ? 6 : labels + counts + 2 * GAP;
  const right = stacked ? width - 6 : width - readouts - GAP / 2;
  const axis = axisOf(input, all, { left, right, width });

  const headings: { key: string; label: string; y: number }[] = [];
  const rows: PlacedBox[] = [];
  const guides: { from: number; to: number }[] = [];
  let y = HEAD;
  for (const group of input.groups) {
    headings.push({ key: group.key, label: group.label, y: y + HEADING / 2 + 2 });
    y += HEADING;
    const top = y;
    for (const row of group.rows) {
      const middle = y + (stacked ? 36 : ROW / 2);
      rows.push(placeRow(row, axis, { wordY: y + (stacked ? 13 : ROW / 2), y: middle }));
      if (stacked) guides.push({ from: middle - 11, to: middle + 11 });
      y += stacked ? STACKED_ROW : ROW;
    }
    if (!stacked) guides.push({ from: top, to: y });
  }
  return {
    ...{ width, height: y + 4, left, right, stacked },
    countX: labels + GAP + counts,
    underX: width - over - (over > 0 ? GAP : 0),
    norm: axis.place(NORM),
    marks: axis.marks,
    ...{ headings, rows, guides },
  };
}

/** How high the picture is where nothing is stacked, so that its place can be kept before it is drawn. */
export function useBoxHeight({ groups }: UseBoxInput): number {
  return groups.reduce((sum, { rows }) => sum + HEADING + rows.length * ROW, HEAD + 4);
}

function axisOf(
  input: UseBoxInput,
  rows: readonly UseBoxRow[],
  { left, right, width }: { left: number; right: number; width: number },
): ValueAxis {
  const values = rows.flatMap(({ spread }) => (spread ? [spread.p10, spread.p90] : []));
  return valueAxis('log', [...input.limits, ...values], NORM, input.marks, left, right, width);
}

function placeRow(
  { spread, ...row }: UseBoxRow,
  axis: ValueAxis,
  place: { wordY: number; y: number },
): PlacedBox {
  return {
    ...row,
    ...place,
    box: spread && {
      p10: axis.place(spread.p10),
      p25: axis.place(spread.p25),
      median: axis.place(spread.median),
      p75: axis.place(spread.p75),
      p90: axis.place(spread.p90),
    },
    beyond: {
      left: spread !== null && axis.beyond(spread.p10) === 'left',
      right: spread !== null && axis.beyond(spread.p90) === 'right',
    },
  };
}
