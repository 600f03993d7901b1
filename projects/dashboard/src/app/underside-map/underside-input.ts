import type { Action, Condition, Side, Zone } from '#shared/domain/vocabulary';

/** A zone on a side of the car: `centre` is the middle of the car, or both sides where the zone has no middle. */
export interface UndersidePlace {
  readonly zone: Zone;
  readonly side: Side;
}

/** The share of cars with rot in one place. `share` null: too few cars yet, drawn as hatching. */
export interface UndersideArea extends UndersidePlace {
  readonly share: number | null;
  readonly cars: number;
  readonly withRot?: number | null;
  /** The 95 % interval of the share. */
  readonly lower?: number | null;
  readonly upper?: number | null;
  /** A further line of words for whoever points at the place. */
  readonly words?: string;
}

/** A finding of one job as the map marks it. */
export interface UndersideFinding extends UndersidePlace {
  readonly ref: string;
  readonly seenAs: Condition;
  readonly workedAs?: Condition | null;
  readonly structural: boolean;
  readonly action?: Action | null;
}
