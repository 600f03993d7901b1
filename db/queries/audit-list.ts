import type { Knex } from 'knex';
import { addDays } from '#shared/domain/calendar';
import { sql } from '../database';
import type { NetworkReader } from './audit';

/** What to look for in the trail: words from their beginning, days in UTC with both ends included. */
export interface AuditFilters {
  from?: string | undefined;
  to?: string | undefined;
  actor?: string | undefined;
  action?: string | undefined;
  subject?: string | undefined;
  /** Code of a branch. */
  branch?: string | undefined;
}

/** An event as the trail keeps it. */
export interface AuditRow {
  id: number;
  at: string;
  actor: string;
  address: string;
  action: string;
  subject: string;
  branch: string | null;
  /** JSON. */
  detail: string;
  hash: string;
  previousHash: string;
}

/** Events that fit, newest first, from below an id on. Ids are found first, so that no detail is read in vain. */
export function listAuditRows(
  db: NetworkReader,
  filters: AuditFilters,
  below: number | null,
  limit: number,
): AuditRow[] {
  const ids = whereEvents(sql('audit_events'), filters)
    .orderBy('audit_events.id', 'desc')
    .limit(limit)
    .select('audit_events.id');
  if (below !== null) ids.where('audit_events.id', '<', below);
  return db.all<AuditRow>(
    sql('audit_events')
      .leftJoin('branches', 'branches.id', 'audit_events.branch_id')
      .whereIn('audit_events.id', ids)
      .orderBy('audit_events.id', 'desc')
      .select('audit_events.id', 'at', 'actor', 'address', 'action', 'subject', {
        branch: 'branches.code',
        detail: 'detail',
        hash: 'hash',
        previousHash: 'previous_hash',
      }),
  );
}

/** Every actor, or every action, that occurs, in order. */
export function listAuditNames(db: NetworkReader, column: 'actor' | 'action'): string[] {
  return db
    .all<{ name: string }>(
      sql('audit_events')
        .distinct({ name: column })
        .orderByRaw('?? collate nocase, ??', [column, column]),
    )
    .map(({ name }) => name);
}

/** When the oldest event was, or null in an empty trail. */
export function firstEventAt(db: NetworkReader): string | null {
  const [first] = db.all<{ at: string }>(sql('audit_events').orderBy('id').limit(1).select('at'));
  return first?.at ?? null;
}

function whereEvents(query: Knex.QueryBuilder, filters: AuditFilters): Knex.QueryBuilder {
  const { from, to, branch } = filters;
  if (from !== undefined) query.where('at', '>=', from);
  // An instant of a day sorts behind the day's own text, and before that of the next.
  if (to !== undefined) query.where('at', '<', addDays(to, 1));
  for (const column of ['actor', 'action', 'subject'] as const) {
    const word = filters[column];
    if (word === undefined || word === '') continue;
    query.whereRaw('(?? collate nocase >= ? and ?? collate nocase < ?)', [
      column,
      word,
      column,
      word + LAST,
    ]);
  }
  if (branch !== undefined) {
    query.whereIn('audit_events.branch_id', sql('branches').where({ code: branch }).select('id'));
  }
  return query;
}

/** The last character there is: whatever begins with a word sorts before the word and it. */
const LAST = '\u{10ffff}';
