import type { Knex } from 'knex';
import type { BodyType } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** Which cars a change of costs may reach. */
export interface Reach {
  /** Completed from this day on. */
  from?: string;
  /** Completed before this day. */
  before?: string | null;
  branch?: string;
  package?: string;
  bodyType?: BodyType;
}

/** A car that a change may touch. */
export interface TouchedCar {
  branch: string;
  completedOn: string;
  /** The job as recorded, JSON. */
  content: string;
}

/** How many cars there are, at how many branches, and when the first and the last were completed. */
export interface CarSpan {
  jobs: number;
  branches: number;
  from: string | null;
  to: string | null;
}

/** The cars in scope that a change may reach, one at a time. */
export function iterateTouched(db: ScopedDb, reach: Reach): IterableIterator<TouchedCar> {
  const query = reached(db, reach)
    .join('job_revisions as r', (join) =>
      join.on('r.job_id', 'f.job_id').andOn('r.revision', 'f.revision'),
    )
    .select({ branch: 'branches.code', completedOn: 'f.completed_on', content: 'r.content' });
  return db.iterate<TouchedCar>(query);
}

/** Counts the cars of a branch, or of a region. */
export function countCars(db: ScopedDb, place: { branch: string } | { region: string }): CarSpan {
  const query = db
    .table('job_facts', 'f')
    .join('branches', 'branches.id', 'f.branch_id')
    .count({ jobs: '*' })
    .countDistinct({ branches: 'f.branch_id' })
    .min({ from: 'f.completed_on' })
    .max({ to: 'f.completed_on' });
  if ('branch' in place) query.where('branches.code', place.branch);
  else {
    query.join('regions', 'regions.id', 'branches.region_id').where('regions.code', place.region);
  }
  return db.first<CarSpan>(query) ?? { jobs: 0, branches: 0, from: null, to: null };
}

function reached(db: ScopedDb, reach: Reach): Knex.QueryBuilder {
  const query = db.table('job_facts', 'f').join('branches', 'branches.id', 'f.branch_id');
  if (reach.from !== undefined) query.where('f.completed_on', '>=', reach.from);
  if (reach.before != null) query.where('f.completed_on', '<', reach.before);
  if (reach.branch !== undefined) query.where('branches.code', reach.branch);
  if (reach.bodyType !== undefined) query.where('f.body_type', reach.bodyType);
  if (reach.package !== undefined) {
    query.whereIn('f.package_id', sql('packages').where({ code: reach.package }).select('id'));
  }
  return query;
}
