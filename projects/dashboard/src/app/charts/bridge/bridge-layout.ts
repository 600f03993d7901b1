import { scaleLinear } from 'd3-scale';
import { textWidth } from '../text-width';
import type { BridgeInput, BridgeRole, BridgeRow } from './bridge-input';

/** A row with its place in the picture, px. */
export interface PlacedStep {
  readonly key: string;
  readonly label: string;
  readonly text: string;
  readonly role: BridgeRole;
  readonly strong: boolean;
  /** Middle of the line of words. */
  readonly wordY: number;
  readonly barX: number;
  readonly barY: number;
  readonly barWidth: number;
}

/** Everything the bridge draws, in px of the picture. */
export interface BridgeLayout {
  readonly width: number;
  readonly height: number;
  readonly bar: number;
  /** Where 0 stands. */
  readonly zero: number;
  /** Heights between which the line of 0 runs: all through, or beside each bar that stands under its words. */
  readonly axis: readonly { readonly from: number; readonly to: number }[];
  readonly steps: readonly PlacedStep[];
  /** Lines from the end of one bar to the start of the next. */
  readonly joins: readonly { readonly x: number; readonly from: number; readonly to: number }[];
  /** Hairline above the last total. */
  readonly rule: number | null;
}

const ROW = 33;
const BAR = 20;
const TOP = 16;
const BEFORE_LAST = 6;
const LEAST_BARS = 80;
const GAP = 17;
const STACKED_WORDS = 20;
const STACKED_ROW = 50;
const STUB = 7;

/**
 * Lays out a bridge: words left, bars, amounts right in one column. Where words and amounts leave the bars less than 80 px, each
 * bar moves under its words. Pure.
 */
export function layOutBridge(input: BridgeInput, width: number): BridgeLayout {
  const { rows } = input;
  const words = Math.max(0, ...rows.map(({ label, strong }) => textWidth(label, weight(strong))));
  const amounts = Math.max(0, ...rows.map(({ text, strong }) => textWidth(text, weight(strong))));
  const stacked = width - words - amounts - 2 * GAP < LEAST_BARS;
  const left = stacked ? 1 : words + GAP;
  const right = stacked ? width - 1 : width - amounts - GAP;

  const spans = spansOf(rows);
  const reach = spans.flat();
  const x = scaleLinear([Math.min(0, ...reach), Math.max(0, ...reach, 1e-9)], [left, right]);
  const pitch = stacked ? STACKED_ROW : ROW;
  const yOf = (index: number): number => TOP + index * pitch + pushed(rows, index);

  const steps = rows.map((row, index): PlacedStep => {
    const [from, to] = spans[index]!;
    const start = x(Math.min(from, to));
    return {
      key: row.key,
      label: row.label,
      text: row.text,
      role: row.role,
      strong: row.strong,
      wordY: yOf(index),
      barX: start,
      barY: stacked ? yOf(index) + STACKED_WORDS / 2 : yOf(index) - BAR / 2,
      // A step too small to see still leaves a line.
      barWidth: Math.max(x(Math.max(from, to)) - start, row.value === 0 ? 0 : 1),
    };
  });
  const last = rows.length - 1;
  const bottom = (steps.at(-1)?.barY ?? TOP) + BAR;
  return {
    width,
    height: bottom + 8,
    bar: BAR,
    zero: x(0),
    axis: stacked
      ? steps.map(({ barY }) => ({ from: barY - 2, to: barY + BAR + 2 }))
      : [{ from: 0, to: bottom + 7 }],
    steps,
    joins: steps.slice(1).map((step, index) => ({
      x: x(spans[index]![1]),
      // A step of nothing has no bar: the line runs on through its row.
      from: steps[index]!.barY + (rows[index]!.value === 0 ? 0 : BAR),
      // Under words the line is only begun, so that it runs through none.
      to: stacked ? steps[index]!.barY + BAR + STUB : step.barY,
    })),
    rule:
      last > 0 && pushed(rows, last) > 0 && !stacked ? yOf(last) - ROW / 2 - BEFORE_LAST / 2 : null,
  };
}

/** Room before a closing total, so that it stands apart from the steps. */
function pushed(rows: readonly BridgeRow[], index: number): number {
  return index > 0 && index === rows.length - 1 && rows[index]!.kind === 'total' ? BEFORE_LAST : 0;
}

function spansOf(rows: readonly BridgeRow[]): (readonly [number, number])[] {
  let reached = 0;
  return rows.map(({ kind, value }) => {
    const from = kind === 'total' ? 0 : reached;
    reached = from + value;
    return [from, reached];
  });
}

function weight(strong: boolean): 400 | 600 {
  return strong ? 600 : 400;
}
