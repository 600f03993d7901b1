import { wilsonInterval } from '../stats/wilson-interval';

/** Cars, or findings where findings are counted, below which no share, mean, ratio or quantile is told (rule 13). */
export const FEWEST_CARS = 5;

/** A share with its 95 % interval, all 0 … 1; all three null where too few stand behind them. */
export interface ToldShare {
  share: number | null;
  lower: number | null;
  upper: number | null;
}

/** A share with its Wilson interval, or nulls where too few stand behind it. */
export function shareOf(part: number, whole: number): ToldShare {
  const interval = whole < FEWEST_CARS ? undefined : wilsonInterval(part, whole);
  return {
    share: interval?.estimate ?? null,
    lower: interval?.lower ?? null,
    upper: interval?.upper ?? null,
  };
}
