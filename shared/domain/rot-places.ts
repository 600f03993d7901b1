import { isRot, type RecordedFinding } from './recorded-job';
import { SIDES, ZONES, type Side, type Zone } from './vocabulary';

/** Where under a car. */
export interface Place {
  zone: Zone;
  side: Side;
}

/** The places of a car's rot as one whole number, a bit a zone and side: 45 bits, so doubles hold it exactly. A place counts once whatever the findings. */
export function rotPlaces(
  findings: readonly Pick<RecordedFinding, 'zone' | 'side' | 'seenAs' | 'workedAs'>[],
): number {
  const bits = new Set(findings.filter(isRot).map(bitOf));
  let places = 0;
  for (const bit of bits) places += 2 ** bit;
  return places;
}

/** The places that such a number holds, in the order of the vocabulary. */
export function placesOf(places: number): Place[] {
  return ZONES.flatMap((zone) =>
    SIDES.filter((side) => Math.floor(places / 2 ** bitOf({ zone, side })) % 2 === 1).map(
      (side) => ({ zone, side }),
    ),
  );
}

/** The number that holds one place, or all sides of a zone. */
export function placesMask(zone: Zone, side?: Side): number {
  const sides: readonly Side[] = side ? [side] : SIDES;
  return sides.reduce<number>((mask, each) => mask + 2 ** bitOf({ zone, side: each }), 0);
}

function bitOf({ zone, side }: Place): number {
  return SIDES.length * ZONES.indexOf(zone) + SIDES.indexOf(side);
}
