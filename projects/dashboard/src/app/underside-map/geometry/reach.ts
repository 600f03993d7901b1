import { cornersOf, type Point } from './outline';

/** How far a point lies from a path's outline, 0 inside it; in units of the drawing. */
export function distanceTo(path: string, point: Point): number {
  const corners = cornersOf(path);
  if (isInside(corners, point)) return 0;
  let nearest = Infinity;
  corners.forEach((corner, index) => {
    const next = corners[(index + 1) % corners.length]!;
    nearest = Math.min(nearest, toLine(point, corner, next));
  });
  return nearest;
}

/** The area that a path encloses. */
export function areaOf(path: string): number {
  const corners = cornersOf(path);
  const twice = corners.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = corners[(index + 1) % corners.length]!;
    return sum + x * nextY - nextX * y;
  }, 0);
  return Math.abs(twice) / 2;
}

/** A candidate with the shapes that a touch may reach. */
export interface Reachable {
  readonly shapes: readonly string[];
}

/**
 * What lies within `radius` of a touch, nearest first; of those that lie under it together, the smallest first, since it is drawn
 * on top of the larger.
 */
export function withinReach<Place extends Reachable>(
  places: readonly Place[],
  touch: Point,
  radius: number,
): readonly Place[] {
  return places
    .map((place) => ({
      place,
      distance: Math.min(...place.shapes.map((shape) => distanceTo(shape, touch))),
      area: Math.min(...place.shapes.map(areaOf)),
    }))
    .filter(({ distance }) => distance <= radius)
    .sort((a, b) => a.distance - b.distance || a.area - b.area)
    .map(({ place }) => place);
}

function isInside(corners: readonly Point[], [x, y]: Point): boolean {
  let inside = false;
  corners.forEach(([x1, y1], index) => {
    const [x2, y2] = corners[(index + 1) % corners.length]!;
    if (y1 > y !== y2 > y && x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)) inside = !inside;
  });
  return inside;
}

function toLine([x, y]: Point, [x1, y1]: Point, [x2, y2]: Point): number {
  const [dx, dy] = [x2 - x1, y2 - y1];
  const length = dx * dx + dy * dy;
  const along = length === 0 ? 0 : ((x - x1) * dx + (y - y1) * dy) / length;
  const t = Math.min(1, Math.max(0, along));
  return Math.hypot(x - x1 - t * dx, y - y1 - t * dy);
}
