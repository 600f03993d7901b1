/** How a week stands against the limits: the shape of its mark. `partial` weeks are cut by the period or not over yet (rule 7). */
export type MarginMark = 'plain' | 'outside' | 'run_low' | 'run_high' | 'partial';

/** One week as the weekly chart draws it; the words come ready from the page. */
export interface MarginPoint {
  /** ISO week, `2026-W05`. */
  readonly week: string;
  /** Margin as a share of what was billed; `null` leaves a gap. */
  readonly share: number | null;
  readonly mark: MarginMark;
  /** Sentence beside the mark ("Week 46: below, 29 %"), for marks that need one. */
  readonly flag: string | null;
  /** Tooltip and spoken text, three lines at most, the first one naming the week. */
  readonly lines: readonly string[];
}

/** What the weekly chart draws: shares as fractions, weeks oldest first. */
export interface WeeklyMarginInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly points: readonly MarginPoint[];
  readonly limits: {
    readonly centre: number;
    readonly lower: number;
    readonly upper: number;
  } | null;
  /** A target line, drawn as a reference. */
  readonly target: number | null;
  /** The week that the page speaks of. */
  readonly chosen: string;
}
