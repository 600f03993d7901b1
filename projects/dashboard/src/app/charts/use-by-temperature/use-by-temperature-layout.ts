import { scaleLinear } from 'd3-scale';
import { widestText } from '../text-width';
import type { TemperatureClass, UseByTemperatureInput } from './use-by-temperature-input';

/** Height of the picture, px. */
export const TEMPERATURE_HEIGHT = 236;
const TOP = 10;
const BOTTOM = 184;
/** Asked for; the scale makes 2 to 5 lines of it. */
const STEPS = 2;
const GAP = 8;
const WIDEST_BAR = 34;
const BETWEEN_WORDS = 8;

/** One class with its place, px. */
export interface PlacedClass {
  readonly fromC: number;
  readonly count: string;
  /** Middle of its column. */
  readonly x: number;
  readonly left: number;
  readonly width: number;
  /** Null where there are too few cars. */
  readonly bar: { readonly top: number; readonly height: number; readonly median: number } | null;
}

/** Everything the chart draws, in px of the picture. */
export interface UseByTemperatureLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly ticks: readonly { readonly y: number; readonly text: string }[];
  /** Temperatures between the columns. */
  readonly degrees: readonly { readonly x: number; readonly text: string }[];
  readonly classes: readonly PlacedClass[];
}

/** Lays out quartiles of use in columns of temperature; the axis starts at its lowest tick. Pure. */
export function layOutUseByTemperature(
  input: UseByTemperatureInput,
  width: number,
): UseByTemperatureLayout {
  const { classes } = input;
  const values = classes.flatMap(({ quartiles }) =>
    quartiles ? [quartiles.p25, quartiles.p75] : [],
  );
  const y = scaleLinear()
    .domain(values.length > 0 ? [Math.min(...values), Math.max(...values)] : [0, 1])
    .nice(STEPS)
    .range([BOTTOM, TOP]);
  const ticks = values.length > 0 ? y.ticks(STEPS) : [];
  const words = ticks.map(input.tick);
  const left = Math.max(widestText(words), widestText(['cars'])) + GAP;
  const from = Math.min(...classes.map(({ fromC }) => fromC));
  const to = Math.max(...classes.map(({ toC }) => toC));
  const x = scaleLinear()
    .domain([from, to])
    .range([left, width - 8]);
  return {
    ...{ width, height: TEMPERATURE_HEIGHT, left, right: width - 8, top: TOP, bottom: BOTTOM },
    ticks: ticks.map((tick, index) => ({ y: y(tick), text: words[index]! })),
    degrees: degreesOf(classes, x),
    classes: classes.map((one) => {
      const start = x(one.fromC);
      const room = x(one.toC) - start;
      const bar = Math.min(WIDEST_BAR, room * 0.6);
      return {
        fromC: one.fromC,
        count: one.count,
        x: start + room / 2,
        left: start + (room - bar) / 2,
        width: bar,
        bar: one.quartiles && {
          top: y(one.quartiles.p75),
          height: y(one.quartiles.p25) - y(one.quartiles.p75),
          median: y(one.quartiles.median),
        },
      };
    }),
  };
}

/** Both ends of every class once, leaving out what would touch the words before it. */
function degreesOf(
  classes: readonly TemperatureClass[],
  x: (value: number) => number,
): { x: number; text: string }[] {
  const ends = [...new Set(classes.flatMap(({ fromC, toC }) => [fromC, toC]))].sort(
    (a, b) => a - b,
  );
  const shown: { x: number; text: string; end: number }[] = [];
  for (const degrees of ends) {
    const text = String(degrees).replace('-', '−');
    const half = widestText([text]) / 2;
    const place = x(degrees);
    const last = shown.at(-1);
    if (!last || place - half >= last.end + BETWEEN_WORDS) {
      shown.push({ x: place, text, end: place + half });
    }
  }
  return shown.map(({ x: place, text }) => ({ x: place, text }));
}
