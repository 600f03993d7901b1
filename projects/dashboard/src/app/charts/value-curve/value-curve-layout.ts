import { scaleLinear } from 'd3-scale';
import { textWidth, widestText } from '../text-width';
import type { ValueCurveInput } from './value-curve-input';

/** Everything the chart draws, in px of the picture. */
export interface ValueCurveLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  readonly xTicks: readonly { readonly at: number; readonly text: string }[];
  readonly yTicks: readonly { readonly y: number; readonly text: string }[];
  readonly path: string;
  readonly dots: readonly { readonly x: number; readonly y: number }[];
  readonly chosen: {
    readonly x: number;
    readonly y: number;
    readonly text: string;
    readonly wordX: number;
    readonly wordY: number;
  } | null;
}

const TOP = 26;
const FOOT = 26;
const GAP = 10;
/** Height of the picture, whatever its width. */
export const CURVE_HEIGHT = 236;

/** Lays out a curve over two linear axes; the value axis starts where the data do, not at 0. Pure. */
export function layOutValueCurve(input: ValueCurveInput, width: number): ValueCurveLayout {
  const { points, chosen, xText, yText } = input;
  const all = chosen ? [...points, chosen] : points;
  const y = scaleLinear()
    .domain(reach(all.map((point) => point.y)))
    .nice(4);
  const yTicks = y.ticks(4);
  const left = widestText(yTicks.map(yText)) + GAP;
  const right = width - textWidth(xText(points.at(-1)?.x ?? 0)) / 2;
  const bottom = CURVE_HEIGHT - FOOT;
  const x = scaleLinear()
    .domain(reach(all.map((point) => point.x)))
    .range([left, right]);
  y.range([bottom, TOP]);
  const dots = points.map((point) => ({ x: x(point.x), y: y(point.y) }));
  return {
    ...{ width, left, right, bottom, dots },
    height: CURVE_HEIGHT,
    xTicks: x.ticks(5).map((value) => ({ at: x(value), text: xText(value) })),
    yTicks: yTicks.map((value) => ({ y: y(value), text: yText(value) })),
    path: dots.map((dot, index) => `${index === 0 ? 'M' : 'L'}${dot.x} ${dot.y}`).join(''),
    chosen: chosen && placeChosen(chosen, x(chosen.x), y(chosen.y), left),
  };
}

/** The words of the chosen point stand up left of it, where a rising curve leaves room, and never before the axis. */
function placeChosen({ text }: { text: string }, x: number, y: number, left: number) {
  const width = textWidth(text, 600);
  const wordX = Math.max(left + 4 + width, x - 14);
  return { x, y, text, wordX, wordY: Math.max(10, y - 16) };
}

function reach(values: readonly number[]): [number, number] {
  return [Math.min(...values), Math.max(...values)];
}
