import type { ScopedDb } from '../scoped-db';

/** How far the record of a branch reaches. */
export interface ReceivedThrough {
  branchId: number;
  receivedThrough: string | null;
  lastReceivedAt: string | null;
}

/** The newest day of completion and the newest receipt of every branch in scope that has sent a job. */
export function readReceivedThrough(db: ScopedDb): ReceivedThrough[] {
  const days = new Map(
    db
      .all<{ branchId: number; day: string }>(
        db
          .table('job_facts')
          .groupBy('branch_id')
          .select({ branchId: 'branch_id' })
          .max({ day: 'completed_on' }),
      )
      .map(({ branchId, day }) => [branchId, day]),
  );
  const receipts = db.all<{ branchId: number; at: string }>(
    db
      .table('jobs')
      .join('job_revisions', {
        'job_revisions.job_id': 'jobs.id',
        'job_revisions.revision': 'jobs.revision',
      })
      .groupBy('jobs.branch_id')
      .select({ branchId: 'jobs.branch_id' })
      .max({ at: 'job_revisions.received_at' }),
  );
  return receipts.map(({ branchId, at }) => ({
    branchId,
    receivedThrough: days.get(branchId) ?? null,
    lastReceivedAt: at,
  }));
}
