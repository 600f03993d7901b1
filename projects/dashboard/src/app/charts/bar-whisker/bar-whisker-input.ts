import type { AxisMark } from '../value-axis';

/** One bar from 0 with a whisker on to a further value; null: nothing known, the words alone. */
export interface BarWhiskerRow {
  readonly key: string;
  readonly label: string;
  readonly value: number | null;
  readonly further: number | null;
  readonly text: string;
  /** The row that sums up or stands out: its bar in ink, its words strong. */
  readonly chosen: boolean;
}

/** Rows of bars with whiskers over one axis from 0. */
export interface BarWhiskerInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly BarWhiskerRow[];
  readonly marks: readonly AxisMark[];
}
