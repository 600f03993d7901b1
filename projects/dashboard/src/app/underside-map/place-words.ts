import { formatCars, formatCount, formatShare, formatShareRange } from '../ui/format';
import { SIDE_NAMES, ZONE_NAMES } from '../ui/words';
import type { UndersideArea, UndersidePlace } from './underside-input';

/** Said where a share cannot be. */
export const TOO_FEW = 'too few cars yet';

/** A place as it is read and heard: "sill, outer, left". */
export function placeName({ zone, side }: UndersidePlace): string {
  return `${ZONE_NAMES[zone]}, ${SIDE_NAMES[side]}`;
}

/** A key of a place, unique among places. */
export function placeKey({ zone, side }: UndersidePlace): string {
  return `${zone}/${side}`;
}

/** The share with its interval in one breath: "24 % (19–30 %)". */
export function shareWords({ share, lower, upper }: UndersideArea): string {
  if (share === null) return TOO_FEW;
  const known = lower !== undefined && lower !== null && upper !== undefined && upper !== null;
  return known ? `${formatShare(share)} (${formatShareRange(lower, upper)})` : formatShare(share);
}

/** The cars behind a share: "51 of 214 cars". */
export function carsWords({ withRot, cars }: UndersideArea): string {
  return withRot === undefined || withRot === null
    ? formatCars(cars)
    : `${formatCount(withRot)} of ${formatCars(cars)}`;
}

/** What pointing at an area tells: three lines, the place first. */
export function areaLines(area: UndersideArea): readonly string[] {
  return [placeName(area), shareWords(area), area.words ?? carsWords(area)];
}
