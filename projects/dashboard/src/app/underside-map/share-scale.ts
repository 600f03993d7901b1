/** Lower bounds of the classes of share: each step doubles, the same for all ages (rule of the pictures: unrounded shares). */
export const CLASS_BOUNDS = [0, 0.025, 0.05, 0.1, 0.2, 0.4] as const;

/** How a shape is filled: a class of share, too few cars, the chosen one, or nothing told. */
export type Look = 'blank' | 'few' | 'chosen' | `step-${0 | 1 | 2 | 3 | 4 | 5}`;

/** The class of an unrounded share, 0 to 5; a bound belongs to the class above it. */
export function classOf(share: number): 0 | 1 | 2 | 3 | 4 | 5 {
  const above = CLASS_BOUNDS.filter((bound) => share >= bound).length;
  return Math.max(0, above - 1) as 0 | 1 | 2 | 3 | 4 | 5;
}

/** How the area of a share is filled. */
export function lookOf(share: number | null): Look {
  return share === null ? 'few' : `step-${classOf(share)}`;
}
