import type { Knex } from 'knex';
import type { LaterArrival } from '#shared/contracts/warranty-reports';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import type { ReceivedMarks } from './warranty-reports';

/** What to look for: received behind the marks, and of the period up to a day. */
export interface LaterQuestion {
  asOf: string;
  received: ReceivedMarks;
}

/** Some of what arrived later, the last received first, and how many there are. */
export interface LaterAnswer {
  items: LaterArrival[];
  count: number;
}

/**
 * Jobs and claims that were received, corrected, voided or brought back after a report and belong to its period. A correction
 * belongs to it by the day it has now or by the one it had: what was moved out of the period is missing from it.
 */
export function laterArrivals(db: ScopedDb, question: LaterQuestion, limit: number): LaterAnswer {
  const parts = [jobsLater(db, question), claimsLater(db, question), voidsLater(db, question)];
  const items = parts.flatMap((part) =>
    db.all<LaterArrival>(part.clone().orderBy('at', 'desc').limit(limit)),
  );
  const count = parts.reduce(
    (sum, part) =>
      sum + (db.first<{ n: number }>(part.clone().clearSelect().count({ n: '*' }))?.n ?? 0),
    0,
  );
  items.sort((a, b) => (a.at < b.at ? 1 : a.at > b.at ? -1 : 0));
  return { items: items.slice(0, limit), count };
}

/** A person's name, or what else sent it. */
const SENDER = `coalesce(people.name, push_keys.label, 'system') as "by"`;

function jobsLater(db: ScopedDb, { asOf, received }: LaterQuestion): Knex.QueryBuilder {
  return sentBy(
    db
      .table('jobs')
      .join('branches', 'branches.id', 'jobs.branch_id')
      .join('job_revisions as r', 'r.job_id', 'jobs.id')
      .leftJoin('job_revisions as p', (join) =>
        join.on('p.job_id', 'r.job_id').andOn('p.revision', sql.raw('r.revision - 1')),
      ),
  )
    .where('r.id', '>', received.jobRevision)
    .whereRaw(inPeriod('completedOn'), [asOf, asOf])
    .select(sql.raw(`'job' as kind`), {
      branch: 'branches.code',
      ref: 'jobs.job_ref',
      jobRef: 'jobs.job_ref',
      at: 'r.received_at',
    })
    .select(
      sql.raw(`case r.revision when 1 then 'new' else 'corrected' end as what`),
      sql.raw(`json_extract(r.content, '$.completedOn') as "on"`),
      sql.raw(SENDER),
      sql.raw('null as "costCents"'),
    );
}

function claimsLater(db: ScopedDb, { asOf, received }: LaterQuestion): Knex.QueryBuilder {
  return sentBy(
    db
      .table('claims')
      .join('branches', 'branches.id', 'claims.branch_id')
      .join(db.derived('jobs'), 'jobs.id', 'claims.job_id')
      .join('claim_revisions as r', 'r.claim_id', 'claims.id')
      .leftJoin('claim_revisions as p', (join) =>
        join.on('p.claim_id', 'r.claim_id').andOn('p.revision', sql.raw('r.revision - 1')),
      ),
  )
    .where('r.id', '>', received.claimRevision)
    .whereRaw(inPeriod('madeOn'), [asOf, asOf])
    .select(sql.raw(`'claim' as kind`), {
      branch: 'branches.code',
      ref: 'claims.claim_ref',
      jobRef: 'jobs.job_ref',
      at: 'r.received_at',
      costCents: 'claims.cost_cents',
    })
    .select(
      sql.raw(`case r.revision when 1 then 'new' else 'corrected' end as what`),
      sql.raw(`json_extract(r.content, '$.madeOn') as "on"`),
      sql.raw(SENDER),
    );
}

/** Voids and ways back stand in the trail, under the path of their job. */
function voidsLater(db: ScopedDb, { asOf, received }: LaterQuestion): Knex.QueryBuilder {
  return db
    .table('jobs')
    .join('branches', 'branches.id', 'jobs.branch_id')
    .join('audit_events as e', (join) =>
      join
        .on('e.branch_id', 'jobs.branch_id')
        .andOn('e.subject', sql.raw(`'/branches/' || branches.code || '/jobs/' || jobs.job_ref`)),
    )
    .join('job_revisions as r', (join) =>
      join.on('r.job_id', 'jobs.id').andOn('r.revision', 'jobs.revision'),
    )
    .leftJoin('people', 'people.id', 'e.person_id')
    .where('e.id', '>', received.event)
    .whereRaw(`e.action in ('job.void', 'job.restore')`)
    .whereRaw(`json_extract(r.content, '$.completedOn') <= ?`, [asOf])
    .select(sql.raw(`'job' as kind`), {
      branch: 'branches.code',
      ref: 'jobs.job_ref',
      jobRef: 'jobs.job_ref',
      at: 'e.at',
    })
    .select(
      sql.raw(`case e.action when 'job.void' then 'voided' else 'restored' end as what`),
      sql.raw(`json_extract(r.content, '$.completedOn') as "on"`),
      sql.raw(`coalesce(people.name, e.actor) as "by"`),
      sql.raw('null as "costCents"'),
    );
}

function inPeriod(field: 'completedOn' | 'madeOn'): string {
  return `(json_extract(r.content, '$.${field}') <= ? or json_extract(p.content, '$.${field}') <= ?)`;
}

function sentBy(query: Knex.QueryBuilder): Knex.QueryBuilder {
  return query
    .leftJoin('people', 'people.id', 'r.person_id')
    .leftJoin('push_keys', 'push_keys.id', 'r.push_key_id');
}
