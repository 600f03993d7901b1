/**
 * Lines of the drawing. Paths are written by hand in absolute `M L C Z` alone, so that a half can be mirrored and joined by
 * arithmetic: what is drawn, what is touched and what the specs measure are the same numbers.
 */

/** The drawing's own units: front at left, the car's left side on top. */
export const CAR = { width: 1000, height: 390, middle: 195 } as const;

export type Point = readonly [x: number, y: number];

interface Step {
  readonly letter: string;
  readonly points: readonly Point[];
}

/** A box with round corners. */
export function box(x: number, y: number, width: number, height: number, radius: number): string {
  const [right, bottom] = [x + width, y + height];
  // How far a corner's handles reach, so that a cubic comes closest to a quarter circle.
  const pull = round(radius * 0.448);
  return [
    `M${x + radius} ${y}`,
    `L${right - radius} ${y} C${right - pull} ${y} ${right} ${y + pull} ${right} ${y + radius}`,
    `L${right} ${bottom - radius} C${right} ${bottom - pull} ${right - pull} ${bottom} ${right - radius} ${bottom}`,
    `L${x + radius} ${bottom} C${x + pull} ${bottom} ${x} ${bottom - pull} ${x} ${bottom - radius}`,
    `L${x} ${y + radius} C${x} ${y + pull} ${x + pull} ${y} ${x + radius} ${y} Z`,
  ].join(' ');
}

/** The same path on the other side of the car. */
export function mirrored(path: string): string {
  return written(
    stepsOf(path).map(({ letter, points }) => ({ letter, points: points.map(across) })),
  );
}

/** A half that begins and ends on the middle line, closed along it. */
export function closedHalf(half: string): string {
  return `${half} Z`;
}

/** Both halves as one outline without a seam. */
export function joined(half: string): string {
  const steps = stepsOf(half);
  const back: Step[] = [];
  for (let index = steps.length - 1; index > 0; index -= 1) {
    const { letter, points } = steps[index]!;
    const start = steps[index - 1]!.points.at(-1)!;
    back.push({ letter, points: [...points.slice(0, -1).reverse(), start].map(across) });
  }
  return `${half} ${written(back)} Z`;
}

/** The corners of a path's first outline, curves taken in short straight lines. */
export function cornersOf(path: string): readonly Point[] {
  const corners: Point[] = [];
  for (const { letter, points } of stepsOf(path)) {
    if (letter !== 'C') corners.push(...points);
    else corners.push(...along(corners.at(-1)!, points as readonly [Point, Point, Point]));
  }
  return corners;
}

const PIECES = 6;

function along(start: Point, [one, two, end]: readonly [Point, Point, Point]): Point[] {
  return Array.from({ length: PIECES }, (_, index) => {
    const t = (index + 1) / PIECES;
    const u = 1 - t;
    const at = (axis: 0 | 1): number =>
      u ** 3 * start[axis] +
      3 * u * u * t * one[axis] +
      3 * u * t * t * two[axis] +
      t ** 3 * end[axis];
    return [at(0), at(1)] as const;
  });
}

function stepsOf(path: string): Step[] {
  return [...path.matchAll(/([MLCZ])([^MLCZ]*)/g)].map(([, letter, rest]) => {
    const numbers = (rest!.match(/-?[\d.]+/g) ?? []).map(Number);
    const points: Point[] = [];
    for (let index = 0; index + 1 < numbers.length; index += 2) {
      points.push([numbers[index]!, numbers[index + 1]!]);
    }
    return { letter: letter!, points };
  });
}

function written(steps: readonly Step[]): string {
  return steps
    .map(({ letter, points }) => letter + points.map(([x, y]) => `${x} ${y}`).join(' '))
    .join(' ');
}

function across([x, y]: Point): Point {
  return [x, round(2 * CAR.middle - y)];
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
