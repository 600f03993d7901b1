import type { ListedJob } from '#db/queries/job-list';
import type { JobRow } from '#shared/contracts/job-list';
import { bridgeOf, largestStep } from '#shared/domain/bridge';
import { daysBetween } from '#shared/domain/calendar';
import {
  costCents,
  marginCents,
  type ActualMoney,
  type ExpectedMoney,
} from '#shared/domain/job-figures';

/** A stored row as a list shows it (rule 84); a recorder's has no money in it at all (rule 24). */
export function tellJob(row: ListedJob, today: string, money: 'seen' | 'unseen'): JobRow {
  const estimated = row.has_estimate === 1;
  const unbilled = row.billed === 0;
  return {
    branch: row.branch,
    jobRef: row.job_ref,
    revision: row.revision,
    vehicle: {
      ...(row.vehicle_key !== null && { key: row.vehicle_key }),
      make: row.make,
      model: row.model,
      bodyType: row.body_type,
      firstRegistered: row.first_registered,
    },
    package: row.package,
    completedOn: row.completed_on,
    hasRot: row.has_rot === 1,
    unbilled,
    daysWaiting: unbilled ? daysBetween(row.completed_on, today) : null,
    estimatedMinutes: estimated ? row.est_minutes : null,
    actualMinutes: row.act_minutes,
    overrunMinutes: estimated ? row.act_minutes - row.est_minutes : null,
    beyondChargedMinutes:
      unbilled && estimated
        ? Math.max(0, row.act_minutes - row.est_minutes - row.charged_repair_minutes)
        : null,
    agreedExtraMinutes: row.extra_minutes,
    ...(money === 'seen' && moneyOf(row)),
  };
}

type JobMoney = Pick<
  JobRow,
  | 'agreedExtraCents'
  | 'revenueCents'
  | 'costCents'
  | 'marginCents'
  | 'marginShare'
  | 'expectedMarginCents'
  | 'largestStep'
>;

function moneyOf(row: ListedJob): JobMoney {
  const costed = row.costed === 1;
  const billed = row.billed === 1;
  const actual = actualOf(row);
  const kept = costed && billed ? marginCents(actual) : null;
  const bridge = kept !== null && row.expected === 1 ? bridgeOf(actual, expectedOf(row)) : null;
  return {
    agreedExtraCents: row.extra_cents,
    revenueCents: costed && billed ? row.revenue_cents : null,
    costCents: costed ? costCents(actual) : null,
    marginCents: kept,
    marginShare: kept !== null && row.revenue_cents > 0 ? kept / row.revenue_cents : null,
    expectedMarginCents: bridge?.expectedMarginCents ?? null,
    largestStep: bridge ? (largestStep(bridge) ?? null) : null,
  };
}

function actualOf(row: ListedJob): ActualMoney {
  return {
    revenueCents: row.revenue_cents,
    labourCents: row.labour_cents,
    repairLabourCents: row.repair_labour_cents,
    productCents: row.product_cents,
    consumablesCents: row.consumables_cents,
    boughtInCents: row.bought_in_cents,
    feeCents: row.fee_cents,
  };
}

function expectedOf(row: ListedJob): ExpectedMoney {
  return {
    priceCents: row.exp_price_cents,
    labourCents: row.exp_labour_cents,
    repairLabourCents: row.exp_repair_labour_cents,
    productCents: row.exp_product_cents,
    feeCents: row.exp_fee_cents,
  };
}
