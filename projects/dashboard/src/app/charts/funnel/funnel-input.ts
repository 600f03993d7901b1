/** Where a branch stands against its own limits: the shape of its mark. */
export type FunnelStand = 'inside' | 'below' | 'above';

/** A branch in the funnel; everything but its cars is a difference from what its own cars lead one to expect. */
export interface FunnelPoint {
  readonly key: string;
  readonly name: string;
  readonly cars: number;
  readonly apart: number;
  readonly lower95: number;
  readonly upper95: number;
  readonly lower998: number;
  readonly upper998: number;
  /** As the answer flags it, not as it is drawn. */
  readonly stand: FunnelStand;
  /** Tooltip and spoken text, three lines at most, the first one naming the branch. */
  readonly lines: readonly string[];
}

/** What the funnel draws, in any order: a branch's place comes from its cars, never from its rank. */
export interface FunnelInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly points: readonly FunnelPoint[];
  /** Says a difference beside the axis: "+10". */
  readonly tick: (apart: number) => string;
}
