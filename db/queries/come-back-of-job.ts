import type { ComeBackChange } from '#shared/contracts/come-back';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { leftFindings, toldInOrder } from './come-back-parts';
import type { ComeBackRow } from './come-back-row';

/** What was left on the car of one job, in the order of the list: few rows found by the job's id. */
export function listLeftOfJob(db: ScopedDb, jobId: number): ComeBackRow[] {
  const all = leftFindings(db).where('f.job_id', jobId);
  return db.all<ComeBackRow>(toldInOrder(sql.from(all.as('c'))));
}

/** One finding left on a car, or `undefined` when the newest revision of its job has no such finding left. */
export function findLeft(
  db: ScopedDb,
  branch: string,
  jobRef: string,
  ref: string,
): ComeBackRow | undefined {
  const job = db.first<{ id: number }>(
    db
      .table('jobs')
      .join('branches', 'branches.id', 'jobs.branch_id')
      .where({ 'branches.code': branch, 'jobs.job_ref': jobRef })
      .select('jobs.id'),
  );
  return job && listLeftOfJob(db, job.id).find((row) => row.ref === ref);
}

/** Every mark that was set on a finding, oldest first, with who set it. */
export function listMarks(db: ScopedDb, jobId: number, ref: string): ComeBackChange[] {
  return db.all<ComeBackChange>(
    db
      .table('come_back_marks', 'm')
      .join('people', 'people.id', 'm.person_id')
      .where({ 'm.job_id': jobId, 'm.ref': ref })
      .orderBy('m.revision')
      .select({
        status: 'm.status',
        dueOn: 'm.due_on',
        note: 'm.note',
        ownerToldOn: 'm.owner_told_on',
        changedBy: 'people.name',
        changedAt: 'm.changed_at',
      }),
  );
}
