import type { RecordedJob } from '#shared/domain/recorded-job';
import type { BodyType } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** The newest job of the scope with a package, one on a body type before any other; `undefined` when there is none. */
export function findLastTime(
  db: ScopedDb,
  { packageId, bodyType, upTo }: { packageId: number; bodyType: BodyType; upTo: string },
): RecordedJob | undefined {
  // Found first and read then: contents are long, and would all be sorted.
  const newest = db
    .table('job_facts')
    .where('package_id', packageId)
    .where('completed_on', '<=', upTo)
    .orderByRaw('body_type = ? desc, completed_on desc, job_id desc', [bodyType])
    .limit(1)
    .select('job_id', 'revision');
  const row = db.first<{ content: string }>(
    sql
      .from(newest.as('newest'))
      .join('job_revisions', {
        'job_revisions.job_id': 'newest.job_id',
        'job_revisions.revision': 'newest.revision',
      })
      .select('content'),
  );
  return row && (JSON.parse(row.content) as RecordedJob);
}
