import type { BranchMeasure, SignalKind } from './vocabulary';

/** On which side of what is usual. */
export type Side = 'low' | 'high';

/** What each kind of signal is told from: flat, so that it is kept and sent as it is. */
export interface FactsByKind {
  /** Dangerous rot left on cars, its day gone by. Strength: how many findings. */
  come_backs_due: {
    findings: number;
    /** The earliest day that was set. */
    oldestDueOn: string;
    /** Findings of which nobody noted that the owner was told in writing. */
    notTold: number;
  };
  /** No job has arrived. Strength: quiet days over the longest usual gap. */
  silence: {
    lastReceivedOn: string;
    /** Days since then on which the branch usually sends, and the longest such gap that is usual there. */
    quietDays: number;
    usualDays: number;
  };
  /** Values that look wrong in the last weeks; a car may stand in several. Strength: how many cars. */
  odd_values: {
    longStages: number;
    muchProduct: number;
    zeroPrices: number;
    /** Cars in a row, the newest last, that took exactly what was estimated; 0 when they do not count. */
    copiedMinutes: number;
  };
  /** Finished cars without an invoice. Strength: how many. */
  unbilled: {
    oldestOn: string;
    oldestDays: number;
    /** What those cost so far whose costs are known. */
    costCents: number;
    withoutCost: number;
    currency: string;
  };
  /** The last whole billed week beyond its limits (rules 5 and 6). Strength: distance from the centre, in distances to the limit. */
  week_outside: {
    week: string;
    side: Side;
    marginShare: number;
    centre: number;
    lower: number;
    upper: number;
  };
  /** Weeks running on one side of the centre. Strength: how many. */
  run_of_eight: { side: Side; weeks: number; lastWeek: string; centre: number };
  /** Outside the funnel, adjusted for age and package (rules 42 and 43). Strength: distance from what is expected, in distances to the 99.8 % limit. */
  left_funnel: {
    side: Side;
    value: number;
    expected: number;
    lower998: number;
    upper998: number;
    from: string;
    to: string;
  };
  /** Weekly overrun climbs above the branch's own. Strength: the cumulative sum, in its limits. */
  drift_overrun: {
    /** Actual over estimated minutes since it began, and what the same cars would usually have had there. */
    ratio: number;
    usualRatio: number;
    weeks: number;
  };
  /** Claims come faster than before. Strength: the cumulative sum, in its limits. */
  drift_claims: { claims: number; expected: number; weeks: number };
}

/** The facts of any kind as they are kept: names with plain values. */
export type SignalFacts = Readonly<Record<string, string | number | boolean | null>>;

/** A signal's kind with its facts. */
export type FactsOf = {
  [Kind in SignalKind]: { kind: Kind; facts: FactsByKind[Kind] };
}[SignalKind];

/** How each measure of branches is named in a sentence. */
export const MEASURE_WORDS: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'labour against estimate',
  rot: 'share of cars with rot',
  claims: 'warranty claims',
  product: 'product against norm',
  margin: 'margin',
};
