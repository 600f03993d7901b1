import type { ClaimFreeCurve } from './claim-free-input';

/** The value axis: its least value and its ticks, as shares. */
export interface ShareAxis {
  readonly low: number;
  readonly ticks: readonly number[];
  /** Decimals that tell the ticks apart, in per cent. */
  readonly decimals: number;
}

const STEPS = [0.001, 0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.25];
const MOST_TICKS = 5;
/** Where no claim was made there is no span to draw: the axis then shows the last per cent. */
const LEAST_SPAN = 0.01;

/** An axis from the lowest of all bands up to all cars, in steps that are read at a glance. Never below 0. */
export function shareAxis(curves: readonly ClaimFreeCurve[]): ShareAxis {
  const values = curves.flatMap(({ months }) =>
    months.flatMap(({ share, lower }) => (share === null ? [] : [lower ?? share])),
  );
  const span = Math.max(LEAST_SPAN, 1 - Math.min(1, ...values));
  const step = STEPS.find((each) => span / each <= MOST_TICKS) ?? 0.25;
  const steps = Math.min(Math.ceil(span / step - 1e-9), Math.round(1 / step));
  return {
    low: 1 - steps * step,
    ticks: Array.from({ length: steps + 1 }, (_, index) => 1 - (steps - index) * step),
    decimals: step < 0.01 ? 1 : 0,
  };
}
