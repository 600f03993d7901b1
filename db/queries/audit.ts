import { createHash } from 'node:crypto';
import { sql, type Query } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Who did something: a person, a push key, or the system itself. */
export interface Actor {
  /** How the trail names them: an e-mail address, `key <id>` or `system`. */
  label: string;
  personId: number | null;
  pushKeyId: string | null;
  /** Network address the request came from, or `local`. */
  address: string;
}

/** Something done in set-up: by whom, when, and the path that was called. */
export interface Deed {
  actor: Actor;
  at: string;
  subject: string;
}

export interface AuditEntry {
  at: string;
  actor: Actor;
  /** What was done, a thing and a verb: `job.void`, `cost.set`, `export.margin`. */
  action: string;
  /** What it was done to, as a path without `/api`. */
  subject: string;
  branchId: number | null;
  detail: Record<string, unknown>;
}

/** Whatever reads rows of the whole network: the trail has no scope, and is head office's alone. */
export interface NetworkReader {
  all<Row>(query: Query): Row[];
}

interface StoredEvent {
  id: number;
  at: string;
  actor: string;
  person_id: number | null;
  push_key_id: string | null;
  address: string;
  action: string;
  subject: string;
  branch_id: number | null;
  detail: string;
  previous_hash: string;
  hash: string;
}

/** Before the first event. */
const GENESIS = '0'.repeat(64);

/** Appends to the trail, chained to the event before it. Runs inside a write. */
export function recordAudit(db: UnscopedDb, entry: AuditEntry): void {
  const last = db.prepare('select hash from audit_events order by id desc limit 1').get() as
    { hash: string } | undefined;
  const row = {
    at: entry.at,
    actor: entry.actor.label,
    person_id: entry.actor.personId,
    push_key_id: entry.actor.pushKeyId,
    address: entry.actor.address,
    action: entry.action,
    subject: entry.subject,
    branch_id: entry.branchId,
    detail: JSON.stringify(entry.detail),
    previous_hash: last?.hash ?? GENESIS,
  };
  db.run(sql('audit_events').insert({ ...row, hash: hashOf(row) }));
}

/** Who did something to a subject last, and when. */
export function findLastEvent(
  db: UnscopedDb,
  action: string,
  subject: string,
): { actor: string; at: string } | undefined {
  return db.first(
    sql('audit_events')
      // Found without regard to case, as the index has it, and told apart with: references of jobs differ by case.
      .whereRaw('subject = ? collate nocase', [subject])
      .where({ action, subject })
      .orderBy('id', 'desc')
      .limit(1)
      .select('actor', 'at'),
  );
}

/** What a check of the trail has found. */
export interface AuditCheck {
  /** Events that follow from each other, from the first on. */
  events: number;
  /** When the first of them was, or null. */
  since: string | null;
  /** The first that does not, or null. */
  brokenAt: number | null;
  /** Hash of the last event that does. */
  lastHash: string;
}

/** Reads the whole trail and checks every link; tells the first event that does not fit. */
export function verifyAudit(db: NetworkReader): AuditCheck {
  let previous = GENESIS;
  let since: string | null = null;
  let events = 0;
  let after = 0;
  for (;;) {
    const page = db.all<StoredEvent>(
      sql('audit_events').where('id', '>', after).orderBy('id').limit(1000),
    );
    if (page.length === 0) return { events, since, brokenAt: null, lastHash: previous };
    for (const event of page) {
      if (
        event.id !== events + 1 ||
        event.previous_hash !== previous ||
        event.hash !== hashOf(event)
      ) {
        return { events, since, brokenAt: event.id, lastHash: previous };
      }
      previous = event.hash;
      since ??= event.at;
      events += 1;
      after = event.id;
    }
  }
}

/** SHA-256 over the event's fields in one order, the hash before it included. */
function hashOf(row: Omit<StoredEvent, 'id' | 'hash'>): string {
  return createHash('sha256')
    .update(
      JSON.stringify([
        row.at,
        row.actor,
        row.person_id,
        row.push_key_id,
        row.address,
        row.action,
        row.subject,
        row.branch_id,
        row.detail,
        row.previous_hash,
      ]),
    )
    .digest('hex');
}
