import type { AxisMark } from '../value-axis';

/** One group's spread; nulls mean too few cars. */
export interface StripRow {
  readonly key: string;
  readonly label: string;
  /** Cars behind it, as it is read. */
  readonly count: string;
  readonly median: number | null;
  readonly p80: number | null;
  readonly p95: number | null;
  /** The P80 as it is read ("+41 %"), or the words for why there is none. */
  readonly text: string;
  readonly chosen: boolean;
}

/** Spread of a per-car figure by group: half, 8 of 10, 19 of 20. */
export interface QuantileStripInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly StripRow[];
  readonly scale: 'linear' | 'log';
  readonly reference: number;
  readonly marks: readonly AxisMark[];
}
