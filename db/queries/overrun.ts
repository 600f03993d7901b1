import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { STAGES } from '#shared/domain/vocabulary';
import type { OverrunGrouping } from '#shared/contracts/overrun';
import { whereJobs, type JobFilters } from './job-filters';

/** What a group's key is read from; the stages are columns of their own. */
const KEYS: Record<Exclude<OverrunGrouping, 'stage'>, string> = {
  branch: 'branches.code',
  region: 'regions.code',
  ageBand: 'job_facts.age_band',
  package: 'packages.code',
  bodyType: 'job_facts.body_type',
  month: 'job_facts.month',
  rotFound: 'job_facts.has_rot',
};

/** How many jobs match, with and without an estimate. */
export function countEstimated(
  db: ScopedDb,
  filters: JobFilters,
): { jobs: number; withoutEstimate: number } {
  const row = db.first<{ jobs: number; withoutEstimate: number | null }>(
    whereJobs(db.table('job_facts'), filters).select(
      sql.raw('count(*) as "jobs", sum(has_estimate = 0) as "withoutEstimate"'),
    ),
  );
  return { jobs: row?.jobs ?? 0, withoutEstimate: row?.withoutEstimate ?? 0 };
}

/** Visits the estimated and actual minutes of every estimated job with its group's key: `[key, estimated, actual]`. */
export function eachRatio(
  db: ScopedDb,
  filters: JobFilters,
  by: Exclude<OverrunGrouping, 'stage'>,
  visit: (row: [string | number, number, number]) => void,
): void {
  const query = whereJobs(db.table('job_facts'), filters).where('job_facts.has_estimate', 1);
  if (by === 'branch' || by === 'region') {
    query.join('branches', 'branches.id', 'job_facts.branch_id');
  }
  if (by === 'region') query.join('regions', 'regions.id', 'branches.region_id');
  if (by === 'package') query.join('packages', 'packages.id', 'job_facts.package_id');
  db.each(
    query.select(sql.raw(KEYS[by]), 'est_minutes', 'act_minutes'),
    visit as (row: unknown[]) => void,
  );
}

/** Visits the minutes of every estimated job by stage: total estimated and actual, then estimated and actual of each stage. */
export function eachStages(
  db: ScopedDb,
  filters: JobFilters,
  visit: (row: number[]) => void,
): void {
  db.each(
    whereJobs(db.table('job_facts'), filters)
      .where('job_facts.has_estimate', 1)
      .select(
        'est_minutes',
        'act_minutes',
        ...STAGES.flatMap((stage) => [`est_${stage}`, `act_${stage}`]),
      ),
    visit as (row: unknown[]) => void,
  );
}
