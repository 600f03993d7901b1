import type { ListedClaim } from '#db/queries/claim-list';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { monthInService, warrantyEnd } from '#shared/domain/warranty-cover';

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
    month: monthInService(row.completed_on, row.made_on),
    inWarranty:
      row.warranty_months > 0 && row.made_on <= warrantyEnd(row.completed_on, row.warranty_months),
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
