import { scaleLinear, scaleSqrt } from 'd3-scale';
import { formatCount } from '../../ui/format';
import { spreadLabels } from '../spread-labels';
import { widestText } from '../text-width';
import type { FunnelInput, FunnelPoint } from './funnel-input';
import { type PlacedName, placeNames } from './place-names';

/** A branch with its place in the picture and those of its own limits, px. */
export interface PlacedBranch extends Pick<FunnelPoint, 'key' | 'name' | 'stand' | 'lines'> {
  readonly x: number;
  readonly y: number;
  readonly upper95: number;
  readonly lower95: number;
  readonly upper998: number;
  readonly lower998: number;
}

/** Everything the funnel draws, px. */
export interface FunnelLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly zero: number;
  readonly ticks: readonly { readonly y: number; readonly text: string }[];
  readonly cars: readonly { readonly x: number; readonly text: string }[];
  /** In the order of their cars, then of their names. */
  readonly branches: readonly PlacedBranch[];
  readonly wash: string;
  readonly limits95: readonly string[];
  readonly limits998: readonly string[];
  readonly names: readonly PlacedName[];
  readonly labels: readonly { readonly y: number; readonly text: string }[];
}

const TOP = 12;
const HEIGHT = { narrow: 320, wide: 400 };
const NARROW = 560;
const BETWEEN_LABELS = 18;
/** Two branches of as many cars still stand apart, so that each dot has its own limits above and below it. */
const LEAST_APART = 2;
/** Limits run on a little beyond the first and the last branch, px. */
const BEYOND = 18;
const BEYOND_ONE = 90;
/** Between two counts under the picture, px. */
const BETWEEN_COUNTS = 6;

/** Lays out the funnel for a width in px. Pure: the same input and width give the same picture. */
export function layOutFunnel(input: FunnelInput, width: number): FunnelLayout {
  const narrow = width < NARROW;
  const bottom = TOP + (narrow ? HEIGHT.narrow : HEIGHT.wide);
  const y = scaleLinear(reach(input.points), [bottom, TOP]);
  const ticks = y.ticks(5).map((tick) => ({ y: y(tick), text: input.tick(tick) }));
  const words = narrow
    ? ['99.8 %', '95 %', 'expected']
    : ['99.8 % limit', '95 % limit', 'as expected'];
  const left = widestText(ticks.map(({ text }) => text)) + 10;
  const right = Math.max(left + 80, width - widestText(words) - 12);
  const order = [...input.points].sort((a, b) => a.cars - b.cars || (a.key < b.key ? -1 : 1));
  const counts = order.map(({ cars }) => cars);
  const one = order.length === 1;
  const x = scaleSqrt(
    [Math.min(...counts) * (one ? 0.5 : 0.94), Math.max(...counts) * (one ? 1.5 : 1.03)],
    [left + BEYOND, right - BEYOND],
  );
  let before = -Infinity;
  const branches = order.map((point): PlacedBranch => {
    before = Math.max(x(point.cars), before + LEAST_APART);
    return {
      key: point.key,
      name: point.name,
      stand: point.stand,
      lines: point.lines,
      x: before,
      y: y(point.apart),
      // A limit beyond the picture is beyond every dot.
      upper95: Math.max(TOP, y(point.upper95)),
      lower95: Math.min(bottom, y(point.lower95)),
      upper998: Math.max(TOP, y(point.upper998)),
      lower998: Math.min(bottom, y(point.lower998)),
    };
  });
  const beyond = one ? BEYOND_ONE : BEYOND;
  const along = (of: (branch: PlacedBranch) => number): [number, number][] => {
    const [first, last] = [branches[0], branches.at(-1)];
    if (!first || !last) return [];
    return [
      [Math.max(left, first.x - beyond), of(first)],
      ...branches.map((branch): [number, number] => [branch.x, of(branch)]),
      [Math.min(right, last.x + beyond), of(last)],
    ];
  };
  const upper95 = along((branch) => branch.upper95);
  const lower95 = along((branch) => branch.lower95);
  const upper998 = along((branch) => branch.upper998);
  const lower998 = along((branch) => branch.lower998);
  const ends = [upper998, upper95, [[0, y(0)] as [number, number]], lower95, lower998];
  const heights = spreadLabels(
    ends.map((line) => line.at(-1)?.[1] ?? y(0)),
    BETWEEN_LABELS,
  );
  const [outer = '', inner = '', middle = ''] = words;
  return {
    width,
    height: bottom + 44,
    left,
    right,
    top: TOP,
    bottom,
    zero: y(0),
    ticks,
    cars: readable(
      x
        .ticks(narrow ? 4 : 8)
        .filter((count) => Number.isInteger(count))
        .map((count) => ({ x: x(count), text: formatCount(count) })),
    ),
    branches,
    wash: branches.length > 0 ? `${pathOf([...upper95, ...[...lower95].reverse()])}Z` : '',
    limits95: [pathOf(upper95), pathOf(lower95)],
    limits998: [pathOf(upper998), pathOf(lower998)],
    names: placeNames(
      branches
        .filter(({ stand }) => !narrow || stand !== 'inside')
        .map((branch) => ({
          x: branch.x,
          y: branch.y,
          text: branch.name,
          must: branch.stand !== 'inside',
        })),
      branches,
      { left, right: right - 4, top: TOP - 8, bottom: bottom - 2 },
    ),
    labels:
      branches.length > 0
        ? [outer, inner, middle, inner, outer].map((text, index) => ({ text, y: heights[index]! }))
        : [],
  };
}

/** All dots, and the limits of the middle branch: those of one with very few cars may run out of the picture, being beyond all dots. */
function reach(points: readonly FunnelPoint[]): [number, number] {
  const apart = points.map((point) => point.apart);
  const upper = Math.max(0, ...apart, lowerMedian(points.map((point) => point.upper998)));
  const lower = Math.min(0, ...apart, -lowerMedian(points.map((point) => -point.lower998)));
  const pad = Math.max(upper - lower, 1e-6) * 0.05;
  return [lower - pad, upper + pad];
}

function lowerMedian(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[Math.floor((values.length - 1) / 2)] ?? 0;
}

/** Those of some counts, from the left, that do not run into the one before. */
function readable<Count extends { x: number; text: string }>(counts: readonly Count[]): Count[] {
  let end = -Infinity;
  return counts.filter(({ x, text }) => {
    const half = widestText([text]) / 2;
    if (x - half < end + BETWEEN_COUNTS) return false;
    end = x + half;
    return true;
  });
}

function pathOf(points: readonly (readonly [number, number])[]): string {
  return points
    .map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${round(x)} ${round(y)}`)
    .join('');
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
