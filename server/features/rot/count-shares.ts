import type { OpenedUp } from '#shared/contracts/rot';
import { shareOf, type ToldShare } from '#shared/domain/small-samples';

/** Cars, those of them with rot, and their share with its interval; the share is withheld below five cars. */
export function countedShare(
  cars: number,
  withRot: number,
): ToldShare & { cars: number; withRot: number } {
  return { cars, withRot, ...shareOf(withRot, cars) };
}

/** Of bubbles that were worked, how many opened into a hole (rule 46). */
export function openedShare({ worked, holed }: { worked: number; holed: number }): OpenedUp {
  return { worked, holed, ...shareOf(holed, worked) };
}
