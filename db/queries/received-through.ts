import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** How far the record of a branch reaches. */
export interface ReceivedThrough {
  branchId: number;
  receivedThrough: string | null;
  lastReceivedAt: string | null;
}

/** The newest day of completion among the jobs that count, and the newest receipt, of every branch in scope that has sent a job. */
export function readReceivedThrough(db: ScopedDb): ReceivedThrough[] {
  // The newest of each branch is looked up by itself: grouped, every row of history would be read.
  const days = new Map(
    db
      .all<{ branchId: number; day: string | null }>(
        sql.from(sql.raw('json_each(?) as branches', [db.scope.idsJson])).select(
          sql.raw(
            `branches.value as "branchId", (select max(job_facts.completed_on) from ?
                where job_facts.branch_id = branches.value) as day`,
            [db.derived('job_facts')],
          ),
        ),
      )
      .map(({ branchId, day }) => [branchId, day]),
  );
  // Revisions are numbered as they come in, so the newest is found without reading what they hold.
  const newest = db
    .table('jobs')
    .join('job_revisions', 'job_revisions.job_id', 'jobs.id')
    .groupBy('jobs.branch_id')
    .select({ branchId: 'jobs.branch_id' })
    .max({ id: 'job_revisions.id' });
  return db
    .all<{ branchId: number; at: string }>(
      sql
        .from(newest.as('newest'))
        .join('job_revisions', 'job_revisions.id', 'newest.id')
        .select({ branchId: 'newest.branchId', at: 'job_revisions.received_at' }),
    )
    .map(({ branchId, at }) => ({
      branchId,
      receivedThrough: days.get(branchId) ?? null,
      lastReceivedAt: at,
    }));
}
