import type { Side, Zone } from '#shared/domain/vocabulary';
import { isSided, shapesOf } from './geometry/place-shapes';
import type { UndersidePlace } from './underside-input';

/** A place with the shapes that show it. */
export interface Painted<Area> {
  readonly area: Area;
  readonly shapes: readonly string[];
  /** Sides of the car on which the shapes lie. */
  readonly sides: readonly Side[];
}

/** Which area is shown where, and those that no shape is left for: told in words below the map. */
export interface Painting<Area> {
  readonly painted: readonly Painted<Area>[];
  readonly inWords: readonly Area[];
}

/**
 * Gives every area its shapes. Left and right are exact and come first; the centre takes what is its own (the tunnel, a whole
 * zone on the middle), else the sides that nothing exact was said of. What then has no shape is said in words.
 */
export function paintAreas<Area extends UndersidePlace>(areas: readonly Area[]): Painting<Area> {
  const painted: Painted<Area>[] = [];
  const inWords: Area[] = [];
  const taken = new Set<string>();
  const exactFirst = [...areas].sort((a, b) => rank(a.side) - rank(b.side));
  for (const area of exactFirst) {
    const { zone } = area;
    const sides = sidesFor(area).filter((side) => !taken.has(`${zone}/${side}`));
    sides.forEach((side) => taken.add(`${zone}/${side}`));
    if (sides.length === 0) inWords.push(area);
    else painted.push({ area, ...drawn(zone, area.side, sides) });
  }
  return { painted, inWords };
}

function rank(side: Side): number {
  return side === 'centre' ? 1 : 0;
}

function sidesFor({ zone, side }: UndersidePlace): readonly Side[] {
  if (side !== 'centre') return [side];
  return zone === 'floor' ? ['centre'] : ['left', 'right'];
}

function drawn(
  zone: Zone,
  asked: Side,
  sides: readonly Side[],
): Pick<Painted<unknown>, 'shapes' | 'sides'> {
  const whole = asked === 'centre' && sides.length === 2 && !isSided(zone);
  const shown: readonly Side[] = whole ? ['centre'] : sides;
  return { sides: shown, shapes: shown.flatMap((side) => shapesOf(zone, side)) };
}
