import { textWidth, widestText } from '../text-width';
import { type PlacedMark, type ValueAxis, valueAxis } from '../value-axis';
import type { WaitDotsInput, WaitRow } from './wait-dots-input';

/** A mark with its place in the picture, px. */
export interface PlacedDot {
  readonly x: number;
  readonly y: number;
  readonly ringed: boolean;
}

/** A group with its place in the picture, px. */
export interface PlacedWait extends Pick<WaitRow, 'key' | 'label' | 'count' | 'text' | 'danger'> {
  readonly wordY: number;
  /** Right end of the count. */
  readonly countX: number;
  /** The line on which the group's marks stand. */
  readonly base: number;
  /** Top of the room for its marks. */
  readonly top: number;
  readonly dots: readonly PlacedDot[];
  readonly medianX: number | null;
}

/** Everything the chart draws, in px of the picture. */
export interface WaitDotsLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  /** Whether each group's marks stand under its words. */
  readonly stacked: boolean;
  readonly marks: readonly PlacedMark[];
  /** The height of each group's room, between which the lines of marks run. */
  readonly guides: readonly { readonly from: number; readonly to: number }[];
  readonly rows: readonly PlacedWait[];
}

const HEAD = 28;
const GAP = 16;
/** Room of one mark, sideways and upwards, while there is room. */
const PITCH = 10;
/** The most that a group may rise; beyond it its marks move into each other. */
const MOST_HEIGHT = 92;
const LEAST_HEIGHT = 34;
const LEAST_PLOT = 220;
const WORDS = 26;

/** Width of a picture on a wide window; a narrower one is never lower. */
const USUAL_WIDTH = 1174;

/** Height of the picture before its width is known, so that nothing moves when it comes. */
export function usualWaitHeight(input: WaitDotsInput): number {
  return layOutWaitDots(input, USUAL_WIDTH).height;
}

/** Stacks each group's marks over the time they have waited. Pure. */
export function layOutWaitDots(input: WaitDotsInput, width: number): WaitDotsLayout {
  const labels = widestText(
    input.rows.map(({ label }) => label),
    600,
  );
  const counts = widestText(input.rows.map(({ count }) => count));
  const texts = widestText(input.rows.map(({ text }) => text));
  const stacked = width - labels - counts - texts - 4 * GAP < LEAST_PLOT;
  const left = stacked ? 8 : labels + counts + 2 * GAP;
  const right = stacked ? width - 8 : width - texts - GAP;
  const values = input.rows.flatMap(({ dots }) => dots.map(({ value }) => value));
  const axis = valueAxis('linear', values, 0, input.marks, left, right, width);
  const rows: PlacedWait[] = [];
  let y = HEAD;
  for (const row of input.rows) {
    const stacks = stacksOf(row, axis, left);
    const most = Math.max(1, ...[...stacks.values()].map((stack) => stack.length));
    const pitch = Math.min(PITCH, MOST_HEIGHT / most);
    const room = Math.max(LEAST_HEIGHT, most * pitch + 10);
    const top = y + (stacked ? WORDS : 0);
    const base = top + room;
    rows.push({
      ...{ key: row.key, label: row.label, count: row.count, text: row.text, danger: row.danger },
      top,
      base,
      countX: stacked ? textWidth(row.label, 600) + GAP / 2 + textWidth(row.count) : left - GAP,
      wordY: stacked ? y + 12 : base - 10,
      dots: [...stacks].flatMap(([x, stack]) =>
        stack.map((ringed, index) => ({ x, y: base - 7 - index * pitch, ringed })),
      ),
      medianX: row.median === null ? null : axis.place(row.median),
    });
    y = base + GAP;
  }
  return {
    ...{ width, left, right, stacked, rows, marks: axis.marks },
    guides: rows.map(({ top, base }) => ({ from: top, to: base })),
    height: y,
  };
}

/** Marks that would lie on each other stand on each other, the ringed ones below, where the eye begins. */
function stacksOf(
  { dots }: WaitRow,
  axis: ValueAxis,
  left: number,
): ReadonlyMap<number, readonly boolean[]> {
  const stacks = new Map<number, boolean[]>();
  for (const { value, ringed } of dots) {
    const x = left + Math.round((axis.place(value) - left) / PITCH) * PITCH;
    stacks.set(x, [...(stacks.get(x) ?? []), ringed]);
  }
  for (const stack of stacks.values()) stack.sort((a, b) => Number(b) - Number(a));
  return stacks;
}
