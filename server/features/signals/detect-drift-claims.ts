import { addDays } from '#shared/domain/calendar';
import type { FactsByKind } from '#shared/domain/signal-facts';
import { tabularCusum } from '#shared/stats/cusum';
import { plainSignal, type FoundSignal } from './found-signal';

/** Weeks that are judged, and the weeks before them that say how a branch stood. */
export const JUDGED_CLAIM_WEEKS = 52;
export const EARLIER_CLAIM_WEEKS = 104;
/** Claims come singly, so the sum adds log-likelihoods of twice as many against as many as expected, not σ of a week. */
const TIMES = 2;
/** Where the sum tells of a drift, in log-likelihood: chosen by simulation (see `false-alarms.md`). */
const H = 4.5;
/** How a branch stood before is drawn towards what is expected as if it had had this many claims as expected. */
const LEVEL_WEIGHT = 8;
/** Fewer claims than this are a coincidence, however few were expected. */
const FEWEST_CLAIMS = 5;

/** A branch's counted claims and those expected of its cars under warranty, week by week, the oldest first. */
export interface ClaimWeeks {
  branchId: number;
  /** Monday of the first week. */
  monday: string;
  claims: readonly (readonly { ref: string; madeOn: string }[])[];
  expected: readonly number[];
}

/**
 * Cumulative sum of the log-likelihood ratio of Poisson counts, twice the usual rate against the usual one, in the same
 * tabular form. Usual is what the network's rates give for the branch's cars under warranty, times how the branch stood to
 * them before: one that always has more claims is the funnel's to tell.
 *
 * Source: J. M. Lucas, "Counted data CUSUM's", Technometrics 27 (1985), 129–144.
 */
export function detectDriftClaims(
  { branchId, monday, claims, expected }: ClaimWeeks,
  behind: readonly number[],
): FoundSignal[] {
  const start = claims.length - JUDGED_CLAIM_WEEKS;
  if (start < 0) return [];
  const level =
    (claims.slice(0, start).flat().length + LEVEL_WEIGHT) /
    (sum(expected.slice(0, start)) + LEVEL_WEIGHT);
  const usual = expected.map((value) => value * level);
  const steps = claims
    .slice(start)
    .map((made, week) => made.length * Math.log(TIMES) - (TIMES - 1) * usual[start + week]!);
  const { high } = tabularCusum(steps, { target: 0, k: 0, h: H });
  const reached = high.at(-1) ?? 0;
  if (reached <= H / 2) return [];
  const begun = start + high.findLastIndex((value) => value === 0) + 1;
  const made = claims.slice(begun).flat();
  if (made.length < FEWEST_CLAIMS) return [];
  const facts: FactsByKind['drift_claims'] = {
    claims: made.length,
    expected: sum(usual.slice(begun)),
    weeks: claims.length - begun,
  };
  const listed = new Map(made.map(({ ref, madeOn }) => [ref, madeOn]));
  return [
    {
      ...plainSignal({
        branchId,
        kind: 'drift_claims',
        key: 'up',
        since: addDays(monday, 7 * begun),
        strength: reached / H,
        facts: { ...facts },
        cars: listed.size,
        listed: [...listed].map(([ref, madeOn]) => ({ ref, why: `claim of ${madeOn}` })),
      }),
      behind: [...behind],
      weight: reached > H ? 'open' : 'keep',
    },
  ];
}

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
