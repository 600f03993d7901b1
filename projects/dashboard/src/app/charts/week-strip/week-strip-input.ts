/** How a week stands against the branch's own usual range. */
export type StripMark = 'plain' | 'outside' | 'run_low' | 'run_high';

/** One week of a small picture; `null` leaves a gap. */
export interface StripWeek {
  readonly week: string;
  readonly value: number | null;
  readonly mark: StripMark;
}

/** One branch's weeks, small, on a scale that it shares with others. */
export interface WeekStripInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly weeks: readonly StripWeek[];
  /** `bars` for counts, which have no usual range. */
  readonly look: 'line' | 'bars';
  readonly usual: {
    readonly centre: number;
    readonly lower: number;
    readonly upper: number;
  } | null;
  /** Drawn as a line of its own, apart from the usual range. */
  readonly target: number | null;
  /** Least and greatest value of all pictures beside each other. */
  readonly scale: readonly [number, number];
  /** Values with a hairline and a word. */
  readonly ticks: readonly { readonly value: number; readonly text: string }[];
}
