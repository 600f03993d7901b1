import { alongTheCar } from './geometry/place-shapes';
import { paintAreas } from './paint-areas';
import { areaLines, placeKey } from './place-words';
import { lookOf } from './share-scale';
import type { DrawnPlace } from './underside-car';
import type { UndersideArea } from './underside-input';

/** Areas as the car draws them, in the order of the arrow keys. */
export function drawnAreas(areas: readonly UndersideArea[]): readonly DrawnPlace[] {
  const { painted } = paintAreas(areas);
  const shapesOf = new Map(painted.map(({ area, shapes }) => [area, shapes]));
  return alongTheCar(painted.map(({ area }) => area)).map((area) => ({
    key: placeKey(area),
    name: areaLines(area).join(', '),
    look: lookOf(area.share),
    shapes: shapesOf.get(area)!,
  }));
}
