import type { BranchMeasure } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** A measure in one week of one branch: Σ a over Σ e of the cars that it counts. */
export interface BranchWeekSums {
  branchId: number;
  week: string;
  cars: number;
  a: number;
  e: number;
}

const SUMMED: Record<
  Exclude<BranchMeasure, 'claims'>,
  { a: string; e: string; counted: Readonly<Record<string, number>> }
> = {
  overrun: { a: 'act_minutes', e: 'est_minutes', counted: { has_estimate: 1 } },
  rot: { a: 'has_rot', e: '1', counted: {} },
  product: { a: 'normed_ml', e: 'norm_ml', counted: {} },
  margin: { a: 'margin_cents', e: 'revenue_cents', counted: { billed: 1, costed: 1 } },
};

/** The weeks of each branch in which the measure counts a car, in order. */
export function readBranchWeeks(
  db: ScopedDb,
  measure: Exclude<BranchMeasure, 'claims'>,
  filters: JobFilters,
): BranchWeekSums[] {
  const { a, e, counted } = SUMMED[measure];
  const query = whereJobs(db.table('job_facts'), filters).where(counted);
  if (measure === 'product') query.where('norm_ml', '>', 0);
  return db.all<BranchWeekSums>(
    query
      .groupBy('branch_id', 'week')
      .orderBy(['branch_id', 'week'])
      .select(
        { branchId: 'branch_id', week: 'week' },
        sql.raw(`count(*) as cars, sum(${a}) as a, sum(${e}) as e`),
      ),
  );
}
