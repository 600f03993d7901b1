import type { AxisMark } from '../value-axis';

/** Spread of single cars as shares of the norm: 0.9 is nine tenths of it. */
export interface Spread {
  readonly p10: number;
  readonly p25: number;
  readonly median: number;
  readonly p75: number;
  readonly p90: number;
}

/** One kind of car. `spread` null: too few cars, drawn as hatching with `text`. */
export interface UseBoxRow {
  readonly key: string;
  readonly label: string;
  /** Cars behind it, as it is read. */
  readonly count: string;
  readonly spread: Spread | null;
  /** Cars that got far too little, as it is read ("18 % under"); empty when there are none. */
  readonly under: string;
  readonly over: string;
  /** Whether the cars under are enough to be looked at. */
  readonly strong: boolean;
  readonly text: string;
}

/** Rows that belong together under one heading. */
export interface UseBoxGroup {
  readonly key: string;
  readonly label: string;
  readonly rows: readonly UseBoxRow[];
}

/** Spread of product a car against its norm, by kind of car. */
export interface UseBoxInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly groups: readonly UseBoxGroup[];
  /** Offered marks; those inside the axis are drawn, the norm always. */
  readonly marks: readonly AxisMark[];
  /** Shares of the norm that are always on the axis: the limits of under and over. */
  readonly limits: readonly number[];
}
