import { spreadLabels } from '../spread-labels';
import { textWidth, widestText } from '../text-width';
import type { ClaimFreeCurve, ClaimFreeInput } from './claim-free-input';
import { curvePaths } from './curve-paths';
import { shareAxis } from './share-axis';

/** A number of cars at risk under its tick. */
export interface PlacedCount {
  readonly x: number;
  readonly text: string;
}

/** One group's curve, its words at the right end, and its row of cars at risk, px. */
export interface PlacedCurve {
  readonly key: string;
  readonly label: string;
  /** Which of the four ways it is drawn. */
  readonly way: number;
  readonly line: string;
  readonly band: string;
  readonly share: string;
  readonly endX: number;
  readonly endY: number;
  readonly labelY: number;
  readonly nameY: number;
  readonly countsY: number;
  readonly counts: readonly PlacedCount[];
}

/** Everything the chart draws, in px of the picture. */
export interface ClaimFreeLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly bottom: number;
  /** Whether the names stand over the cars at risk, each with a piece of its line, for want of room beside the curves. */
  readonly stacked: boolean;
  readonly yTicks: readonly { readonly y: number; readonly text: string }[];
  readonly xTicks: readonly { readonly x: number; readonly text: string }[];
  readonly headY: number;
  readonly curves: readonly PlacedCurve[];
}

const TOP = 12;
const PLOT = 200;
const LINE = 20;
const GAP = 10;
const STACKED_BELOW = 520;
/** From the axis to the words over the cars at risk. */
const TO_HEAD = 50;

/** Height of the picture by the number of its curves, roomy enough for a phone. */
export function curvesHeight(curves: number, stacked = true): number {
  return TOP + PLOT + TO_HEAD + LINE / 2 + curves * LINE * (stacked ? 2 : 1) + (stacked ? 6 : 4);
}

/** Lays out steps with bands over months since completion, with the cars at risk under the axis' own ticks. Pure. */
export function layOutClaimFree(input: ClaimFreeInput, width: number): ClaimFreeLayout {
  const { curves, countText, shareText } = input;
  const stacked = width < STACKED_BELOW;
  const axis = shareAxis(curves);
  const yTexts = axis.ticks.map((tick) => (tick * 100).toFixed(axis.decimals));
  const names = curves.map(({ label }) => label);
  const ends = curves.map((curve) => {
    const share = shareText(lastMonth(curve)?.share ?? 1);
    return stacked ? share : `${share} ${curve.label}`;
  });
  const halfCount = widestText(curves.map(({ cars }) => countText(cars))) / 2;
  const left = Math.max(
    widestText(yTexts) + GAP,
    halfCount + (stacked ? 0 : Math.max(widestText(names, 600), textWidth('months')) + GAP),
  );
  const right = Math.max(left + 40, width - widestText(ends, 600) - GAP);
  const bottom = TOP + PLOT;
  const end = Math.max(1, ...curves.map((curve) => lastMonth(curve)?.month ?? 0));
  const ticks = monthTicks(end, (right - left) / (2 * halfCount + GAP));
  const x = (month: number): number => left + (month / end) * (right - left);
  const y = (share: number): number => bottom - ((share - axis.low) / (1 - axis.low)) * PLOT;
  const endYs = curves.map((curve) => y(lastMonth(curve)?.share ?? 1));
  const labelYs = spreadLabels(endYs, LINE);
  const headY = bottom + TO_HEAD;
  return {
    ...{ width, left, right, bottom, stacked, headY },
    height: curvesHeight(curves.length, stacked),
    yTicks: axis.ticks.map((tick, index) => ({ y: y(tick), text: yTexts[index]! })),
    xTicks: ticks.map((month) => ({ x: x(month), text: String(month) })),
    curves: curves.map((curve, index): PlacedCurve => {
      const rowTop = headY + LINE + index * LINE * (stacked ? 2 : 1);
      return {
        key: curve.key,
        label: curve.label,
        way: index % 4,
        ...curvePaths(curve.months, x, y),
        share: shareText(lastMonth(curve)?.share ?? 1),
        endX: x(lastMonth(curve)?.month ?? 0),
        endY: endYs[index]!,
        labelY: labelYs[index]!,
        nameY: rowTop,
        countsY: rowTop + (stacked ? LINE : 0),
        counts: ticks.map((month) => ({ x: x(month), text: countText(carsAtRisk(curve, month)) })),
      };
    }),
  };
}

/** The last month whose share is told. */
function lastMonth({ months }: ClaimFreeCurve): ClaimFreeCurve['months'][number] | undefined {
  return months.filter(({ share }) => share !== null).at(-1);
}

/** Cars under warranty through a month; at 0 all of them. */
function carsAtRisk({ cars, months }: ClaimFreeCurve, month: number): number {
  return month === 0 ? cars : (months.find((one) => one.month === month)?.atRisk ?? 0);
}

/** Months marked on the axis, as many as their numbers leave room for. */
function monthTicks(end: number, most: number): number[] {
  const step = [1, 3, 6, 12, 24].find((each) => end / each <= Math.min(6, most)) ?? 36;
  return Array.from({ length: Math.floor(end / step) + 1 }, (_, index) => index * step);
}
