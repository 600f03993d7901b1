import type { ClaimDecision } from './vocabulary';

/** What of a claim decides how it stands. */
export interface StandingClaim {
  madeOn: string;
  decision: ClaimDecision;
  decidedOn: string | null;
}

/** Whether a claim counts as of a day, or why it does not. */
export type ClaimStanding = 'counted' | 'refused' | 'after_end' | 'not_yet';

/**
 * How a claim stands on a day (rule 14). A refusal counts from its day, one without a day from the start; `end` is the last
 * day of the car's warranty, undefined without one.
 */
export function claimStanding(
  claim: StandingClaim,
  end: string | undefined,
  asOf: string,
): ClaimStanding {
  if (claim.madeOn > asOf) return 'not_yet';
  if (claim.decision === 'refused' && !isDecidedAfter(claim, asOf)) return 'refused';
  return end !== undefined && claim.madeOn <= end ? 'counted' : 'after_end';
}

/** Whether a claim was undecided on a day: it is open still, or was decided later. */
export function isOpenOn(claim: StandingClaim, day: string): boolean {
  return claim.decision === 'open' || isDecidedAfter(claim, day);
}

function isDecidedAfter({ decidedOn }: StandingClaim, day: string): boolean {
  return decidedOn !== null && decidedOn > day;
}
