import type { AxisMark } from '../value-axis';

/** One thing that waits. */
export interface WaitDot {
  readonly value: number;
  /** Drawn with a ring: something about it is missing; the picture's note says what. */
  readonly ringed: boolean;
}

/** One group of things that wait. */
export interface WaitRow {
  readonly key: string;
  readonly label: string;
  readonly count: string;
  readonly dots: readonly WaitDot[];
  /** Where the middle of the group stands; null where too few say it. */
  readonly median: number | null;
  /** The median as it is read, or the words for why there is none. */
  readonly text: string;
  /** Danger to people: filled triangles in the alarm colour. */
  readonly danger: boolean;
}

/** How long things have waited, each its own mark, by group. */
export interface WaitDotsInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly WaitRow[];
  /** Offered marks; those inside the axis are drawn, 0 always. */
  readonly marks: readonly AxisMark[];
}
