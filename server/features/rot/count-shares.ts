import type { OpenedUp, RotBand } from '#shared/contracts/rot';
import { wilsonInterval } from '#shared/stats/wilson-interval';

/** Cars (or findings) below which no share is told (rule 13). */
export const FEWEST_CARS = 5;

type Interval = Pick<RotBand, 'share' | 'lower' | 'upper'>;

/** Cars, those of them with rot, and their share with its interval; the share is withheld below five cars. */
export function countedShare(
  cars: number,
  withRot: number,
): Interval & { cars: number; withRot: number } {
  return { cars, withRot, ...shareOf(withRot, cars) };
}

/** A share with its Wilson interval, or nulls where too few stand behind it. */
export function shareOf(part: number, whole: number): Interval {
  const interval = whole < FEWEST_CARS ? undefined : wilsonInterval(part, whole);
  return {
    share: interval?.estimate ?? null,
    lower: interval?.lower ?? null,
    upper: interval?.upper ?? null,
  };
}

/** Of bubbles that were worked, how many opened into a hole (rule 46). */
export function openedShare({ worked, holed }: { worked: number; holed: number }): OpenedUp {
  return { worked, holed, ...shareOf(holed, worked) };
}
