import type { Knex } from 'knex';
import { SIDES, ZONES } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

const ORDER = ['danger', 'completed_on', 'branch', 'job_ref', 'place', 'ref'];

/** Every finding left on a car, with its newest mark and the job that closed it. */
export function leftFindings(db: ScopedDb): Knex.QueryBuilder {
  return (
    db
      .table('job_findings', 'f')
      .join(db.derived('job_facts'), 'job_facts.job_id', 'f.job_id')
      .join('branches', 'branches.id', 'f.branch_id')
      .leftJoin(db.derived('come_back_marks', 'm'), (join) => join.on('m.id', '=', newestMark(db)))
      .leftJoin(db.derived('jobs', 'closing'), (join) => join.on('closing.id', '=', closingJob(db)))
      // Written out, so that the index over what was left serves.
      .whereRaw(`f.action in ('deferred', 'declined')`)
      .select(
        ...['f.job_id', 'f.ref', 'f.zone', 'f.side', 'f.seen_as', 'f.worked_as', 'f.structural'],
        ...['f.action', 'f.completed_on', 'job_facts.job_ref', 'job_facts.vehicle_key'],
        ...['job_facts.make', 'job_facts.model', 'job_facts.body_type'],
        ...['job_facts.first_registered', 'm.due_on', 'm.note', 'm.owner_told_on'],
        ...['m.person_id', 'm.changed_at', 'm.revision'],
        { branch: 'branches.code', mark_status: 'm.status', closed_by: 'closing.job_ref' },
        ...[statusOf(), ...urgency()],
      )
  );
}

/** The same under the name `c`, in the order of the list (rule 61). */
export function inOrder(query: Knex.QueryBuilder): Knex.QueryBuilder {
  return query.orderBy(ORDER.map((column) => `c.${column}`));
}

/** The same with the names of who marked them. */
export function toldInOrder(query: Knex.QueryBuilder): Knex.QueryBuilder {
  return inOrder(query)
    .leftJoin('people', 'people.id', 'c.person_id')
    .select('c.*', { changed_by: 'people.name' });
}

/** The id of the mark that holds for a finding `f`: the newest. */
function newestMark(db: ScopedDb): Knex.Raw {
  const newest = db
    .table('come_back_marks', 'k')
    .whereRaw('k.job_id = f.job_id and k.ref = f.ref')
    .orderBy('k.revision', 'desc')
    .limit(1)
    .select('k.id');
  return sql.raw('?', [newest]);
}

/**
 * The id of the job that closed a finding `f`: the earliest later one of the same branch and car that treated or patched the
 * same place (rule 72). On one day, what was received later is later.
 */
function closingJob(db: ScopedDb): Knex.Raw {
  const earliest = db
    .table('job_findings', 'd')
    .whereRaw(
      `d.action in ('treated', 'patched') and d.vehicle_key is not null
        and d.branch_id = f.branch_id and d.vehicle_key = f.vehicle_key
        and d.zone = f.zone and d.side = f.side and d.completed_on >= f.completed_on
        and (d.completed_on > f.completed_on or d.job_id > f.job_id)`,
    )
    .orderBy(['d.completed_on', 'd.job_id'])
    .limit(1)
    .select('d.job_id');
  return sql.raw('?', [earliest]);
}

/** Where a finding stands: a car that is gone stays gone, what a later job mended is done, else as marked, else open. */
function statusOf(): Knex.Raw {
  return sql.raw(
    `case when m.status = 'gone' then 'gone' when closing.id is not null then 'done'
      else coalesce(m.status, 'open') end as status`,
  );
}

/** What the list is sorted by first and last: danger (rule 61), and the place on the car. */
function urgency(): Knex.Raw[] {
  const holed = `(f.seen_as = 'holed' or coalesce(f.worked_as = 'holed', 0))`;
  return [
    sql.raw(`case when f.structural = 1 then iif(${holed}, 0, 1) else iif(${holed}, 2, 3) end
      as danger`),
    sql.raw(`${numbered('f.zone', ZONES)} * ${SIDES.length} + ${numbered('f.side', SIDES)}
      as place`),
  ];
}

function numbered(column: string, words: readonly string[]): string {
  return `case ${column} ${words.map((word, n) => `when '${word}' then ${n}`).join(' ')} end`;
}
