import {
  countJobs,
  listJobRows,
  type JobSort,
  type ListFilters,
  type ListPlace,
} from '#db/queries/job-list';
import type { ScopedDb } from '#db/scoped-db';
import type { JobRow } from '#shared/contracts/jobs';
import { tellJob } from './tell-job';

export interface JobListQuestion {
  filters: ListFilters;
  sort: JobSort;
  after: ListPlace | null;
  limit: number;
  /** Today by branch code, for the days a car has waited. */
  todayByBranch: Record<string, string>;
  money: 'seen' | 'unseen';
}

export interface JobPage {
  items: JobRow[];
  next: ListPlace | null;
  /** All jobs that match. */
  jobs: number;
}

/** One page of the jobs in scope. */
export function listJobs(db: ScopedDb, question: JobListQuestion): JobPage {
  return db.snapshot(() => {
    const { filters, sort, after, limit } = question;
    // One more than asked for tells whether there is a next page.
    const rows = listJobRows(db, filters, sort, after ?? undefined, limit + 1);
    const shown = rows.slice(0, limit);
    const last = rows.length > limit ? shown.at(-1) : undefined;
    return {
      items: shown.map((row) =>
        tellJob(row, question.todayByBranch[row.branch] ?? row.completed_on, question.money),
      ),
      next: last
        ? {
            key: last.sortKey,
            completedOn: last.completed_on,
            branch: last.branch,
            jobRef: last.job_ref,
          }
        : null,
      jobs: countJobs(db, filters),
    };
  });
}
