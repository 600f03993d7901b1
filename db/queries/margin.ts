import { mondayOf } from '#shared/domain/calendar';
import type { MissingCost } from '#shared/domain/job-figures';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** Sums of one week. Money is over billed jobs whose costs are known; the `exp`, `act` pairs over those that have an expectation too. */
export interface WeekSums {
  week: string;
  jobs: number;
  unbilled: number;
  withoutCost: number;
  unbilledCostCents: number;
  revenueCents: number;
  labourCents: number;
  productCents: number;
  consumablesCents: number;
  boughtInCents: number;
  feeCents: number;
  bridgeCars: number;
  expPriceCents: number;
  actRevenueCents: number;
  expLabourCents: number;
  actLabourCents: number;
  expRepairCents: number;
  actRepairCents: number;
  expProductCents: number;
  actProductCents: number;
  actConsumablesCents: number;
  expFeeCents: number;
  actFeeCents: number;
}

/** Whether a job enters margins. */
const KEPT = 'billed = 1 and costed = 1';
/** Whether it enters the bridge. */
const BRIDGED = `${KEPT} and expected = 1`;

const COST =
  'labour_cents + repair_labour_cents + product_cents + consumables_cents + bought_in_cents';

const SUMS: Record<Exclude<keyof WeekSums, 'week'>, string> = {
  jobs: 'count(*)',
  unbilled: 'sum(billed = 0)',
  withoutCost: 'sum(costed = 0)',
  unbilledCostCents: sumWhen('billed = 0 and costed = 1', COST),
  revenueCents: sumWhen(KEPT, 'revenue_cents'),
  labourCents: sumWhen(KEPT, 'labour_cents + repair_labour_cents'),
  productCents: sumWhen(KEPT, 'product_cents'),
  consumablesCents: sumWhen(KEPT, 'consumables_cents'),
  boughtInCents: sumWhen(KEPT, 'bought_in_cents'),
  feeCents: sumWhen(KEPT, 'fee_cents'),
  bridgeCars: `sum(${BRIDGED})`,
  expPriceCents: sumWhen(BRIDGED, 'exp_price_cents'),
  actRevenueCents: sumWhen(BRIDGED, 'revenue_cents'),
  expLabourCents: sumWhen(BRIDGED, 'exp_labour_cents'),
  actLabourCents: sumWhen(BRIDGED, 'labour_cents'),
  expRepairCents: sumWhen(BRIDGED, 'exp_repair_labour_cents'),
  actRepairCents: sumWhen(BRIDGED, 'repair_labour_cents'),
  expProductCents: sumWhen(BRIDGED, 'exp_product_cents'),
  actProductCents: sumWhen(BRIDGED, 'product_cents'),
  actConsumablesCents: sumWhen(BRIDGED, 'consumables_cents + bought_in_cents'),
  expFeeCents: sumWhen(BRIDGED, 'exp_fee_cents'),
  actFeeCents: sumWhen(BRIDGED, 'fee_cents'),
};

const SELECT = Object.entries(SUMS)
  .map(([name, text]) => `${text} as "${name}"`)
  .join(', ');

/** Sums by ISO week of the jobs in scope and filters, oldest week first. */
export function sumWeeks(db: ScopedDb, filters: JobFilters): WeekSums[] {
  return db.all<WeekSums>(
    whereJobs(db.table('job_facts'), filters)
      .groupBy('week')
      .orderBy('week')
      .select('week', sql.raw(SELECT)),
  );
}

/** Revenue and margin of the billed weeks that ended before a day, newest first. */
export function listEarlierWeeks(
  db: ScopedDb,
  before: string,
  filters: JobFilters,
  limit: number,
): { week: string; revenueCents: number; marginCents: number }[] {
  return db.all(
    whereJobs(db.table('job_facts'), { ...filters, from: undefined, to: undefined })
      // The week that `before` cuts is left out: it takes no part in limits (rule 7).
      .where('job_facts.completed_on', '<', mondayOf(before))
      .whereRaw(KEPT)
      .groupBy('week')
      .havingRaw('sum(revenue_cents) > 0')
      .orderBy('week', 'desc')
      .limit(limit)
      .select(
        'week',
        sql.raw(
          `sum(revenue_cents) as "revenueCents", sum(revenue_cents - (${COST}) - fee_cents) as "marginCents"`,
        ),
      ),
  );
}

/** Costs that were missing, each kind and code once with its earliest day (rule 11). */
export function listMissingCosts(db: ScopedDb, filters: JobFilters): MissingCost[] {
  const rows = db.all<{ missing: string }>(
    whereJobs(db.table('job_facts'), filters)
      .whereNotNull('missing_costs')
      .distinct({ missing: 'missing_costs' }),
  );
  const earliest = new Map<string, MissingCost>();
  for (const { missing } of rows) {
    for (const cost of JSON.parse(missing) as MissingCost[]) {
      const key = `${cost.kind} ${cost.code}`;
      const known = earliest.get(key);
      if (!known || cost.on < known.on) earliest.set(key, cost);
    }
  }
  return [...earliest.entries()].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, cost]) => cost);
}

function sumWhen(condition: string, amount: string): string {
  return `sum(case when ${condition} then ${amount} else 0 end)`;
}
