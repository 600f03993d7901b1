import type { Condition } from '#shared/domain/vocabulary';
import { placed, type CarPlace } from './car-place';
import { anchorOf } from './geometry/anchors';
import type { Point } from './geometry/outline';
import { isLeftDangerous } from '#shared/domain/danger';
import { graverOf } from './finding-words';
import type { UndersideFinding } from './underside-input';

/** A numbered mark on the car, CSS px. */
export interface Mark {
  readonly number: number;
  readonly x: number;
  readonly y: number;
  /** The point it belongs to, when it had to move away from it. */
  readonly leader: Point | null;
  readonly condition: Condition;
  readonly dangerous: boolean;
}

/** The size that a mark takes up. */
export interface MarkSize {
  readonly width: number;
  readonly height: number;
}

const GAP = 3;
/** A mark this far from its point is tied to it by a line. */
const TIED_FROM = 14;

/** Numbers the findings in the order given; marks that would lie on each other move apart along the car first, then across it. */
export function layOutMarks(
  findings: readonly UndersideFinding[],
  car: CarPlace,
  size: MarkSize,
): readonly Mark[] {
  const marks: Mark[] = [];
  findings.forEach((finding, index) => {
    const point = placed(car, anchorOf(finding.zone, finding.side));
    const [x, y] = freePlace(point, marks, size);
    marks.push({
      number: index + 1,
      x,
      y,
      leader: Math.hypot(x - point[0], y - point[1]) > TIED_FROM ? point : null,
      condition: graverOf(finding),
      dangerous: isLeftDangerous(finding),
    });
  });
  return marks;
}

function freePlace([x, y]: Point, marks: readonly Mark[], size: MarkSize): Point {
  const across = size.width + GAP;
  const down = size.height + GAP;
  const steps = [0, 1, -1, 2, -2, 3, -3, 4, -4];
  const tries = [0, 1, -1, 2, -2]
    .flatMap((row) => steps.map((column): Point => [x + column * across, y + row * down]))
    .sort((a, b) => Math.hypot(a[0] - x, a[1] - y) - Math.hypot(b[0] - x, b[1] - y));
  const free = tries.find((at) =>
    marks.every((mark) => Math.abs(mark.x - at[0]) >= across || Math.abs(mark.y - at[1]) >= down),
  );
  return free ?? [x, y];
}
