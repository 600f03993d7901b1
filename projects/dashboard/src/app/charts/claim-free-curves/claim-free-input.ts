/** One month of a curve; `share` null from where too few cars are at risk. */
export interface CurveMonth {
  readonly month: number;
  readonly atRisk: number;
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** The cars of one group, month by month since they were finished. */
export interface ClaimFreeCurve {
  readonly key: string;
  /** The group's name as it stands at the end of its curve. */
  readonly label: string;
  readonly cars: number;
  readonly months: readonly CurveMonth[];
}

/** Shares of cars still without a claim, up to four groups of them. */
export interface ClaimFreeInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly curves: readonly ClaimFreeCurve[];
  /** A share as it is read: "97 %". */
  readonly shareText: (share: number) => string;
  readonly countText: (cars: number) => string;
}
