import type { ListedClaim } from '#db/queries/claim-list';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { addMonths } from '#shared/domain/calendar';

/** A stored row as a list shows it; a recorder's has no money in it at all (rule 24). */
export function tellClaim(row: ListedClaim, money: 'seen' | 'unseen'): ClaimRow {
  return {
    branch: row.branch,
    claimRef: row.claim_ref,
    revision: row.revision,
    jobRef: row.job_ref,
    vehicle: {
      make: row.make,
      model: row.model,
      bodyType: row.body_type,
      firstRegistered: row.first_registered,
    },
    package: row.package,
    completedOn: row.completed_on,
    madeOn: row.made_on,
    month: monthSince(row.completed_on, row.made_on),
    inWarranty: row.made_on <= addMonths(row.completed_on, row.warranty_months),
    counted: row.counted === 1,
    zone: row.zone,
    side: row.side,
    cause: row.cause,
    decision: row.decision,
    proposedDecision: row.proposed_decision,
    decidedOn: row.decided_on,
    paidOn: row.paid_on,
    labourMinutes: row.labour_minutes,
    productMl: row.product_ml,
    ...(money === 'seen' && { costCents: row.cost_cents }),
  };
}

/** The month since completion in which a day falls: the smallest m ≥ 1 with the day not after completion plus m months (rule 17). */
function monthSince(completedOn: string, day: string): number {
  const years = Number(day.slice(0, 4)) - Number(completedOn.slice(0, 4));
  const months = 12 * years + Number(day.slice(5, 7)) - Number(completedOn.slice(5, 7));
  return Math.max(1, addMonths(completedOn, months) < day ? months + 1 : months);
}
