import type { Knex } from 'knex';
import type { ScopedDb } from '../scoped-db';

/** A job under way as kept. */
export interface UnderWayRow {
  jobRef: string;
  revision: number;
  /** Its content as JSON text: what "the same" is judged by. */
  text: string;
  startedBy: string;
  startedAt: string;
  changedBy: string;
  changedAt: string;
  photos: number;
}

/** Jobs of a branch that are under way, the last changed first. */
export function listUnderWay(db: ScopedDb, branchId: number): UnderWayRow[] {
  return db.all<UnderWayRow>(
    underWay(db, branchId).orderBy([
      { column: 'changed_at', order: 'desc' },
      { column: 'jobs_under_way.job_ref' },
    ]),
  );
}

/** One job under way. */
export function findUnderWay(
  db: ScopedDb,
  branchId: number,
  jobRef: string,
): UnderWayRow | undefined {
  return db.first<UnderWayRow>(underWay(db, branchId).where('jobs_under_way.job_ref', jobRef));
}

function underWay(db: ScopedDb, branchId: number): Knex.QueryBuilder {
  const photos = db
    .table('photos')
    .whereRaw('photos.branch_id = jobs_under_way.branch_id')
    .whereRaw('photos.job_ref = jobs_under_way.job_ref')
    .count('*')
    .as('photos');
  return db
    .table('jobs_under_way')
    .join({ starter: 'people' }, 'starter.id', 'started_by')
    .join({ changer: 'people' }, 'changer.id', 'changed_by')
    .where('jobs_under_way.branch_id', branchId)
    .select(
      {
        jobRef: 'jobs_under_way.job_ref',
        revision: 'revision',
        text: 'content',
        startedBy: 'starter.name',
        startedAt: 'started_at',
        changedBy: 'changer.name',
        changedAt: 'changed_at',
      },
      photos,
    );
}
