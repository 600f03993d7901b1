import { textWidth } from '../text-width';

/** A name that wants a place beside its dot. */
export interface NameWish {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  /** Has its place before the others and always gets one. */
  readonly must: boolean;
}

/** A name with its place; a leader runs to its dot where it lies further off. */
export interface PlacedName {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly anchor: 'start' | 'end' | 'middle';
  readonly must: boolean;
  readonly leader: { readonly x: number; readonly y: number; readonly toX: number } | null;
}

/** The room that names may take, px. */
export interface NameRoom {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const HALF = 9;
const DOT = 7;
const BESIDE = 11;
const STEP = 17;
/** So many lines above and below its dot a name is looked for. */
const REACH = 9;

/**
 * Places names so that none lies on another or on a dot, each as near to its own dot as the others allow. Those that must be read come
 * first; of the others those without room are left out.
 */
export function placeNames(
  wishes: readonly NameWish[],
  dots: readonly { readonly x: number; readonly y: number }[],
  room: NameRoom,
): PlacedName[] {
  const taken: Box[] = dots.map(({ x, y }) => boxAbout(x, y, DOT, DOT));
  const placed: PlacedName[] = [];
  for (const wish of [...wishes].sort((a, b) => Number(b.must) - Number(a.must))) {
    const found = places(wish, room).find(({ box }) => isFree(box, taken, room));
    if (!found) continue;
    taken.push(found.box);
    placed.push(found.name);
  }
  return placed;
}

/** Places to try, the nearest first; a name that may be left out is not worth a leader. */
function places(wish: NameWish, room: NameRoom): { name: PlacedName; box: Box }[] {
  const { x, y, text, must } = wish;
  const width = textWidth(text, must ? 600 : 400) + 2;
  const beside = (dx: number, dy: number) => {
    const anchor: PlacedName['anchor'] = dx === 0 ? 'middle' : dx > 0 ? 'start' : 'end';
    const at = { x: x + dx, y: y + dy };
    const left = dx === 0 ? at.x - width / 2 : dx > 0 ? at.x : at.x - width;
    const far = Math.abs(dy) > STEP;
    return {
      name: {
        ...at,
        text,
        anchor,
        must,
        leader: far ? { x, y, toX: dx === 0 ? at.x : at.x - Math.sign(dx) * 3 } : null,
      },
      box: { left, right: left + width, top: at.y - HALF, bottom: at.y + HALF },
    };
  };
  const near = [beside(BESIDE, 0), beside(-BESIDE, 0), beside(0, -STEP), beside(0, STEP)];
  if (!must) return near;
  const outward = y < (room.top + room.bottom) / 2 ? -1 : 1;
  const far = Array.from({ length: REACH }, (_, index) => (index + 2) * STEP).flatMap((dy) =>
    [outward * dy, -outward * dy].flatMap((way) => [
      beside(BESIDE, way),
      beside(-BESIDE, way),
      beside(3 * BESIDE, way),
      beside(-3 * BESIDE, way),
    ]),
  );
  return [...near, ...far];
}

function isFree(box: Box, taken: readonly Box[], room: NameRoom): boolean {
  const inside =
    box.left >= room.left &&
    box.right <= room.right &&
    box.top >= room.top &&
    box.bottom <= room.bottom;
  return (
    inside &&
    taken.every(
      (other) =>
        box.right <= other.left ||
        box.left >= other.right ||
        box.bottom <= other.top ||
        box.top >= other.bottom,
    )
  );
}

function boxAbout(x: number, y: number, halfWidth: number, halfHeight: number): Box {
  return { left: x - halfWidth, right: x + halfWidth, top: y - halfHeight, bottom: y + halfHeight };
}
