import type { MissingCost } from '#shared/domain/job-figures';
import type { Period } from '#shared/domain/period';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** Sums in cents over those jobs of one stretch of days that are alike in being billed, costed and expected. */
export interface SpanSums {
  /** Which of the stretches asked for, from 0. */
  span: number;
  billed: 0 | 1;
  costed: 0 | 1;
  expected: 0 | 1;
  jobs: number;
  /** Jobs that want a cost, their own or one of their norm's products. */
  wanting: number;
  revenueCents: number;
  labourCents: number;
  repairLabourCents: number;
  productCents: number;
  consumablesCents: number;
  boughtInCents: number;
  feeCents: number;
  expPriceCents: number;
  expLabourCents: number;
  expRepairLabourCents: number;
  expProductCents: number;
  expFeeCents: number;
}

const SUMS: Record<Exclude<keyof SpanSums, 'span' | 'billed' | 'costed' | 'expected'>, string> = {
  jobs: 'count(*)',
  wanting: 'count(missing_costs)',
  revenueCents: 'sum(revenue_cents)',
  labourCents: 'sum(labour_cents)',
  repairLabourCents: 'sum(repair_labour_cents)',
  productCents: 'sum(product_cents)',
  consumablesCents: 'sum(consumables_cents)',
  boughtInCents: 'sum(bought_in_cents)',
  feeCents: 'sum(fee_cents)',
  expPriceCents: 'sum(exp_price_cents)',
  expLabourCents: 'sum(exp_labour_cents)',
  expRepairLabourCents: 'sum(exp_repair_labour_cents)',
  expProductCents: 'sum(exp_product_cents)',
  expFeeCents: 'sum(exp_fee_cents)',
};
const SELECT = Object.entries(SUMS)
  .map(([name, text]) => `${text} as "${name}"`)
  .join(', ');

/**
 * Sums of each stretch of days (both ends included) over the jobs in scope and filters. Stretch by stretch, because days that
 * lie together were mostly written together, and plain sums by kind of job cost half of sums with a condition in each.
 */
export function sumSpans(
  db: ScopedDb,
  spans: readonly Period[],
  filters: Omit<JobFilters, 'from' | 'to'>,
): SpanSums[] {
  const days = JSON.stringify(spans.map(({ from, to }) => [from, to]));
  return db.all<SpanSums>(
    whereJobs(
      sql.from(
        sql.raw(
          `json_each(?) as spans cross join ?
          on job_facts.completed_on between spans.value ->> 0 and spans.value ->> 1`,
          [days, db.derived('job_facts')],
        ),
      ),
      filters,
    )
      .groupByRaw('spans.key, billed, costed, expected')
      .orderByRaw('spans.key, billed, costed, expected')
      .select(sql.raw('spans.key as span'), 'billed', 'costed', 'expected', sql.raw(SELECT)),
  );
}

/** Revenue and margin in cents of the billed weeks between two days that begin and end a week, newest first. */
export function listBilledWeeks(
  db: ScopedDb,
  filters: JobFilters,
  limit: number,
): { week: string; revenueCents: number; marginCents: number }[] {
  return db.all(
    whereJobs(db.table('job_facts'), filters)
      .where({ billed: 1, costed: 1 })
      .groupBy('week')
      .havingRaw('sum(revenue_cents) > 0')
      .orderBy('week', 'desc')
      .limit(limit)
      .select(
        'week',
        sql.raw(`sum(revenue_cents) as "revenueCents", sum(margin_cents) as "marginCents"`),
      ),
  );
}

/** Costs that were missing, each kind and code once with its earliest day (rule 11). */
export function listMissingCosts(db: ScopedDb, filters: JobFilters): MissingCost[] {
  return db.all<MissingCost>(
    whereJobs(
      db
        .table('job_facts')
        .joinRaw('cross join json_each(job_facts.missing_costs) as missing')
        .whereNotNull('missing_costs'),
      filters,
    )
      .groupByRaw('1, 2')
      .orderByRaw('1, 2')
      .select(
        sql.raw(
          `missing.value ->> 'kind' as "kind", missing.value ->> 'code' as "code", min(missing.value ->> 'on') as "on"`,
        ),
      ),
  );
}
