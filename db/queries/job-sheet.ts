import { senderOf } from '#shared/domain/preconditions';
import type { RecordedJob } from '#shared/domain/recorded-job';
import type { Source } from '#shared/domain/vocabulary';
import type { ScopedDb } from '../scoped-db';

/** A job as its sheet needs it. */
export interface SheetRow {
  jobId: number;
  branch: string;
  jobRef: string;
  revision: number;
  warrantyMonths: number;
  content: RecordedJob;
  receivedAt: string;
  source: Source;
}

export interface RevisionRow {
  revision: number;
  change: 'created' | 'replaced' | 'restored';
  receivedAt: string;
  source: Source;
  personName: string | null;
  keyLabel: string | null;
}

/** A revision as every answer tells it: its sender by name. */
export type ToldRevision = Omit<RevisionRow, 'personName' | 'keyLabel'> & { by: string };

/** Tells a revision; nothing of it is money, so it is the same for every role. */
export function toldRevision({ personName, keyLabel, ...row }: RevisionRow): ToldRevision {
  return { ...row, by: senderOf({ personName, keyLabel }) };
}

/** The newest revision of a job that is not voided, or `undefined`. */
export function findSheet(db: ScopedDb, branch: string, jobRef: string): SheetRow | undefined {
  const row = db.first<Omit<SheetRow, 'content'> & { content: string }>(
    db
      .table('jobs')
      .join('branches', 'branches.id', 'jobs.branch_id')
      .join('job_revisions', (join) =>
        join.on('job_revisions.job_id', 'jobs.id').andOn('job_revisions.revision', 'jobs.revision'),
      )
      .where({ 'branches.code': branch, 'jobs.job_ref': jobRef, 'jobs.voided_at': null })
      .select({
        jobId: 'jobs.id',
        branch: 'branches.code',
        jobRef: 'jobs.job_ref',
        revision: 'jobs.revision',
        warrantyMonths: 'jobs.warranty_months',
        content: 'job_revisions.content',
        receivedAt: 'job_revisions.received_at',
        source: 'job_revisions.source',
      }),
  );
  return row && { ...row, content: JSON.parse(row.content) as RecordedJob };
}

/** Every revision of a job, oldest first, with who sent it. */
export function listRevisions(db: ScopedDb, jobId: number): RevisionRow[] {
  return db.all<RevisionRow>(
    db
      .table('jobs')
      .join('job_revisions', 'job_revisions.job_id', 'jobs.id')
      .leftJoin('people', 'people.id', 'job_revisions.person_id')
      .leftJoin('push_keys', 'push_keys.id', 'job_revisions.push_key_id')
      .where('jobs.id', jobId)
      .orderBy('job_revisions.revision')
      .select({
        revision: 'job_revisions.revision',
        change: 'job_revisions.change',
        receivedAt: 'job_revisions.received_at',
        source: 'job_revisions.source',
        personName: 'people.name',
        keyLabel: 'push_keys.label',
      }),
  );
}
