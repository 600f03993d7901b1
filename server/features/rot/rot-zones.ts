import type { RotZone } from '#shared/contracts/rot';
import { placesOf } from '#shared/domain/rot-places';
import { shareOf } from '#shared/domain/small-samples';
import { AGE_BANDS, ZONES, type Side, type Zone } from '#shared/domain/vocabulary';
import { sidesToTell } from '#shared/domain/zone-sides';
import { countedShare } from './count-shares';

/**
 * Every zone for every age band that has cars, with its sides. A car counts once in a zone and once in each of its sides,
 * whatever its findings; all cars of the band stand behind each (rule 32).
 */
export function rotZones(
  cars: readonly number[],
  byPlaces: ReadonlyMap<number, readonly number[]>,
): RotZone[] {
  const found = carsByPlace(byPlaces);
  const countOf = (zone: Zone, side: Side | 'any', band: number): number =>
    found.get(`${zone} ${side}`)?.[band] ?? 0;
  return ZONES.flatMap((zone) =>
    AGE_BANDS.flatMap((ageBand, band): RotZone[] => {
      const all = cars[band] as number;
      if (all === 0) return [];
      const sides = sidesToTell(zone, (side) => countOf(zone, side, band) > 0).map((side) => {
        const withRot = countOf(zone, side, band);
        return { side, withRot, ...shareOf(withRot, all) };
      });
      return [{ zone, ageBand, ...countedShare(all, countOf(zone, 'any', band)), sides }];
    }),
  );
}

/** Cars by band for every place that has rot, and for every zone whatever the side. */
function carsByPlace(byPlaces: ReadonlyMap<number, readonly number[]>): Map<string, number[]> {
  const found = new Map<string, number[]>();
  for (const [mask, cars] of byPlaces) {
    const places = placesOf(mask);
    const keys = new Set(places.flatMap(({ zone, side }) => [`${zone} any`, `${zone} ${side}`]));
    for (const key of keys) {
      const sum = found.get(key) ?? AGE_BANDS.map(() => 0);
      found.set(
        key,
        sum.map((n, band) => n + (cars[band] as number)),
      );
    }
  }
  return found;
}
