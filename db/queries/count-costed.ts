import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** All cars of a question, those whose costs are not known, and those that want one (rule 11). */
export function countCosted(
  db: ScopedDb,
  filters: JobFilters,
): { jobs: number; withoutCost: number; wanting: number } {
  const row = db.first<{ jobs: number; withoutCost: number; wanting: number }>(
    whereJobs(db.table('job_facts'), filters).select(
      sql.raw(
        `count(*) as jobs, coalesce(sum(costed = 0), 0) as "withoutCost",
          count(missing_costs) as wanting`,
      ),
    ),
  );
  return row ?? { jobs: 0, withoutCost: 0, wanting: 0 };
}
