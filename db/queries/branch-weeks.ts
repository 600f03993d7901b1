import type { BranchMeasure } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { SUMMED, whereCounted } from './branches';
import { whereJobs, type JobFilters } from './job-filters';

/** A measure in one week of one branch: Σ a over Σ e of the cars that it counts. */
export interface BranchWeekSums {
  branchId: number;
  week: string;
  cars: number;
  a: number;
  e: number;
}

/** The weeks of each branch in which the measure counts a car, in order. */
export function readBranchWeeks(
  db: ScopedDb,
  measure: Exclude<BranchMeasure, 'claims'>,
  filters: JobFilters,
): BranchWeekSums[] {
  const { a, e } = SUMMED[measure];
  const query = whereCounted(whereJobs(db.table('job_facts'), filters), measure);
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
