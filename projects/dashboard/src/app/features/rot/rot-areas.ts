import type { RotAnswer } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import type { UndersideArea } from '../../underside-map/underside-input';

/** Zones of one age as the map draws them, one area a side that is told of a zone. */
export function areasOf({ zones }: Pick<RotAnswer, 'zones'>, age: AgeBand): UndersideArea[] {
  return zones
    .filter(({ ageBand }) => ageBand === age)
    .flatMap(({ zone, cars, sides }) => sides.map((side) => ({ ...side, zone, cars })));
}

/** The areas with most rot first, those without any left out. */
export function mostRot(areas: readonly UndersideArea[]): readonly UndersideArea[] {
  return areas
    .filter(({ withRot }) => (withRot ?? 0) > 0)
    .sort((a, b) => (b.withRot ?? 0) - (a.withRot ?? 0));
}
