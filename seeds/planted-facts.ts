import { halfYearLater, halfYearOf } from '#shared/domain/half-year';
import type { Check, Stage, Zone } from '#shared/domain/vocabulary';

/**
 * The truths hidden in the demo network. The generator obeys them; specs compute them from the generated jobs; the browser
 * journeys must find them through the screens. Thresholds are what a reader of the figures may rely on for any seed and day,
 * looser than the value planted. Everything here is invented.
 */
export const PLANTED_FACTS = {
  /** Its weekly margin runs down over the last half year, mostly by price given away at the counter, partly by planned labour. */
  driftingBranch: {
    branch: 'TEG',
    direction: 'down',
    weeks: 26,
    /** Share of the quoted price given away, and planned labour added, by the last week. */
    priceGivenAway: 0.15,
    labourAdded: 0.24,
    signals: ['run_low', 'outside_low'],
    /** Mann–Kendall p of the weekly margin over the last 52 weeks. */
    trendPBelow: 0.01,
    /** Theil–Sen slope over the last 26 weeks, margin share a week. */
    slopePerWeekBelow: -0.003,
  },
  /** It sprays two thirds of the norm, and gets the claims for it. */
  underApplyingBranch: {
    branch: 'PLO',
    ratioToNorm: 0.65,
    ratioToNormBelow: 0.72,
    claimsTimes: 2.3,
    observedOverExpectedAbove: 1.3,
  },
  /** It sprays voids from one end only, often, and gets the claims for it. */
  checkSkippingBranch: {
    branch: 'LAN',
    check: 'bothDirections' satisfies Check,
    shareNo: 0.42,
    shareNoAbove: 0.36,
    shareNoElsewhereBelow: 0.08,
    /** A car sprayed from one end is this many times as likely to come back, at every branch. */
    claimsTimes: 3.4,
    riskRatioAbove: 1.8,
    observedOverExpectedAbove: 1.2,
  },
  /** Everything finished in one calendar half-year comes back more often: a bad delivery of cavity wax. */
  badCohort: {
    /** Half-years before that of today. */
    halfYearsBack: 5,
    claimsTimes: 2.4,
    claimsPerCarAboveNeighboursTimes: 1.4,
    observedOverExpectedAbove: 1.4,
  },
  /** No claim at all, the best rate of the network, and too few cars for it to mean anything. */
  goodSmallBranch: {
    branch: 'HEI',
    openedWeeksBack: 40,
    claims: 0,
    carsBelow: 250,
    flag: 'as_expected',
  },
  /** One stage takes about twice its estimate; its other stages are like everybody's. */
  slowStageBranch: {
    branch: 'SKU',
    stage: 'refit' satisfies Stage,
    times: 1.75,
    ratioAbove: 1.7,
    ratioElsewhereBelow: 1.45,
  },
  /** About double the rot of the other regions once age is allowed for. */
  saltRegion: {
    region: 'BRINE',
    adjustedTimes: 2,
    adjustedTimesAbove: 1.6,
    adjustedTimesBelow: 2.6,
    corrosivityCategory: 'C5',
  },
  /** Where rot is found most often, in every region. */
  worstZone: { zone: 'sill_outer' satisfies Zone },
  /** The model most often rotten for its age among those with many cars. */
  worstModel: { make: 'Velder', model: 'Tessock', ageBand: '10-14' },
  /** Cold wax: more of it goes in when the workshop is cold. */
  coldWax: { product: 'CW1', slopeMlPerDegreeBelow: -20, slopeMlPerDegreeAbove: -80 },
} as const;

/** The calendar half-year (`2024-H1`) whose cars come back more often, seen from a day. */
export function badCohortOn(today: string): string {
  return halfYearLater(halfYearOf(today), -PLANTED_FACTS.badCohort.halfYearsBack);
}
