import type { RecordedJob } from '#shared/domain/recorded-job';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** A voided job as its list shows it. */
export interface VoidedRow {
  id: number;
  branch: string;
  jobRef: string;
  revision: number;
  content: RecordedJob;
  voidedAt: string;
  voidedBy: string | null;
}

/** A place in the list of voided jobs. */
export interface VoidedPlace {
  voidedAt: string;
  id: number;
}

/** The content of one revision of a job in scope. */
export function findRevision(
  db: ScopedDb,
  jobId: number,
  revision: number,
): RecordedJob | undefined {
  const row = db.first<{ content: string }>(
    db
      .table('jobs')
      .join('job_revisions', 'job_revisions.job_id', 'jobs.id')
      .where({ 'jobs.id': jobId, 'job_revisions.revision': revision })
      .select('job_revisions.content'),
  );
  return row && (JSON.parse(row.content) as RecordedJob);
}

/** Who voided a job last: the trail says it of the job's own path. */
const VOIDED_BY = `(select coalesce(people.name, audit_events.actor) from audit_events
  left join people on people.id = audit_events.person_id
  where audit_events.subject = '/branches/' || branches.code || '/jobs/' || jobs.job_ref collate nocase
    and audit_events.subject = '/branches/' || branches.code || '/jobs/' || jobs.job_ref
    and audit_events.action = 'job.void'
  order by audit_events.id desc limit 1) as voidedBy`;

/** Voided jobs of a branch in scope, the last voided first, from behind a place on. */
export function listVoidedRows(
  db: ScopedDb,
  branch: string,
  after: VoidedPlace | null,
  limit: number,
): VoidedRow[] {
  const query = db
    .table('jobs')
    .join('branches', 'branches.id', 'jobs.branch_id')
    .join('job_revisions', (join) =>
      join.on('job_revisions.job_id', 'jobs.id').andOn('job_revisions.revision', 'jobs.revision'),
    )
    .where('branches.code', branch)
    .whereNotNull('jobs.voided_at')
    .orderBy([
      { column: 'jobs.voided_at', order: 'desc' },
      { column: 'jobs.id', order: 'desc' },
    ])
    .limit(limit)
    .select({
      id: 'jobs.id',
      branch: 'branches.code',
      jobRef: 'jobs.job_ref',
      revision: 'jobs.revision',
      content: 'job_revisions.content',
      voidedAt: 'jobs.voided_at',
    })
    .select(sql.raw(VOIDED_BY));
  if (after) query.whereRaw('(jobs.voided_at, jobs.id) < (?, ?)', [after.voidedAt, after.id]);
  return db
    .all<Omit<VoidedRow, 'content'> & { content: string }>(query)
    .map((row) => ({ ...row, content: JSON.parse(row.content) as RecordedJob }));
}
