import type { AxisMark } from '../value-axis';

/** Where an interval lies against the reference; `below` and `above` miss it. */
export type Stand = 'as_expected' | 'below' | 'above';

/** One group. `value` null: too few cars, drawn as hatching with the count and the words. */
export interface IntervalRow {
  readonly key: string;
  readonly label: string;
  /** Cars behind it, as it is read. */
  readonly count: string;
  readonly value: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
  /** Where this row's own reference lies, a tick; for rows that do not share one. */
  readonly tick?: number | null;
  /** The value as it is read ("+23 %"), or the words for why there is none. */
  readonly text: string;
  readonly stand: Stand;
  /** The word that goes with a missed reference ("above"). */
  readonly word: string;
  /** The group that the page speaks of. */
  readonly chosen: boolean;
}

/** Groups as dots with intervals about a reference. */
export interface DotIntervalInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly IntervalRow[];
  readonly scale: 'linear' | 'log';
  /** `ledger`: every dot filled and a hairline under every row, for groups of one rank. */
  readonly look?: 'plain' | 'ledger';
  /** A line through all rows; null where each has a tick of its own. */
  readonly reference: number | null;
  /** How far a log axis goes to either side of the reference at most, in times of it; three unless told. */
  readonly reach?: number;
  /** Offered marks; those inside the axis are drawn, the reference always. */
  readonly marks: readonly AxisMark[];
}
