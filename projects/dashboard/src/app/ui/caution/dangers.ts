/** A danger to people in words: shown by `us-caution`. */
export interface Danger {
  /** The danger in a word: "Fire". */
  readonly danger: string;
  readonly words: string;
}

/** Welding under a car. Common practice, no source; local codes decide. */
export const FIRE: Danger = {
  danger: 'Fire',
  words:
    'Welding near fuel and brake lines, the tank, airbags, tensioners, wiring, underseal and fresh wax: clear or shield them first, keep a fire watch after.',
};

/** A load-bearing place that was mended. */
export const LOAD_BEARING_REPAIR: Danger = {
  danger: 'Load-bearing repair',
  words:
    'It is for a competent and, where required, licensed person; the local inspection rules decide whether it is enough.',
};

/** A load-bearing place that was not mended. */
export const LEFT_ON_CAR: Danger = {
  danger: 'Left on the car',
  words:
    'Load-bearing rot stays on it. The car may not be fit for the road: tell the owner in writing, and note the date.',
};

/** A jacking point that has rot. */
export const ROTTEN_POINT: Danger = {
  danger: 'Lifting',
  words:
    'A jacking point of this car is rotten. Never support the car on it: use other rated, sound points, and check the stands before going under.',
};
