import type { WeeklyMarginInput } from './weekly-margin-input';

/** The value axis in whole per cent: where it starts and ends, and where its hairlines run. */
export interface MarginAxis {
  readonly bottom: number;
  readonly top: number;
  readonly ticks: readonly number[];
}

const STEPS = [1, 2, 5, 10, 20, 25, 50, 100, 200, 250, 500, 1000] as const;
const MOST_HAIRLINES = 4;
/** Room under the lowest mark, as a part of what is shown. */
const FOOT = 0.17;

/**
 * Chooses the value axis: everything that counts is on it, it has at most four hairlines, and it starts at a whole per cent.
 * A week far off (a tiny bill with a large cost) may not flatten the others: the axis reaches at most one band width beyond the
 * limits, or ±100 % without limits, and such a week is drawn on its edge.
 */
export function marginAxis(
  input: Pick<WeeklyMarginInput, 'points' | 'limits' | 'target'>,
): MarginAxis {
  const fixed = [
    ...(input.limits ? [input.limits.lower, input.limits.upper, input.limits.centre] : []),
    ...(input.target === null ? [] : [input.target]),
  ];
  const [least, most] = reach(input.limits);
  const shares = input.points.flatMap(({ share }) =>
    share === null ? [] : [Math.min(most, Math.max(least, share))],
  );
  const values = [...fixed, ...shares].map((share) => share * 100);
  if (values.length === 0) return { bottom: 0, top: 50, ticks: [0, 25, 50] };

  const low = Math.min(...values);
  const high = Math.max(...values);
  const foot = low - FOOT * Math.max(high - low, 4);
  const bottom = low >= 0 && foot < 5 ? 0 : Math.floor(foot);
  for (const step of STEPS) {
    const top = Math.ceil(Math.max(high, bottom + 1) / step) * step;
    const ticks = multiples(step, bottom, top);
    if (ticks.length <= MOST_HAIRLINES) return { bottom, top, ticks };
  }
  return { bottom, top: Math.ceil(high), ticks: [bottom, Math.ceil(high)] };
}

function reach(limits: WeeklyMarginInput['limits']): [number, number] {
  if (!limits) return [-1, 1];
  const band = Math.max(limits.upper - limits.lower, 0.04);
  return [limits.lower - band, limits.upper + band];
}

function multiples(step: number, from: number, to: number): number[] {
  const ticks: number[] = [];
  // `|| 0` turns the −0 that Math.ceil gives just under zero into 0.
  for (let tick = Math.ceil(from / step) * step || 0; tick <= to; tick += step) ticks.push(tick);
  return ticks;
}
