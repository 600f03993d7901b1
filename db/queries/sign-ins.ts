import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';
import type { Role } from '#shared/domain/vocabulary';

/** One sign-in: from a password given on one device to its end. `step` is the newest refresh cookie issued (rule 83). */
export interface SignIn {
  id: number;
  personId: number;
  step: number;
  startedAt: string;
}

/** Who a person's token stands for, as the database has them now. */
export interface SignedIn {
  id: number;
  email: string;
  name: string;
  role: Role;
  branchIds: number[];
  regionCodes: string[];
}

export interface OpenSignIn {
  id: number;
  startedAt: string;
  lastUsedAt: string;
  device: string;
}

const OPEN = 's.ended_at is null and s.expires_at > ? and p.active = 1';

/** Opens a sign-in at step 1 and returns its id. */
export function insertSignIn(
  db: UnscopedDb,
  opened: { personId: number; device: string; at: string; expiresAt: string },
): number {
  return db.run(
    sql('sign_ins').insert({
      person_id: opened.personId,
      step: 1,
      device: opened.device,
      started_at: opened.at,
      last_used_at: opened.at,
      expires_at: opened.expiresAt,
    }),
  ).id;
}

/** A sign-in that has neither ended nor expired and whose person is active. */
export function findOpenSignIn(db: UnscopedDb, id: number, now: string): SignIn | undefined {
  return db
    .prepare(
      `select s.id, s.person_id as personId, s.step, s.started_at as startedAt
       from sign_ins s join people p on p.id = s.person_id where s.id = ? and ${OPEN}`,
    )
    .get(id, now) as SignIn | undefined;
}

/** The person behind a token, if its sign-in is still open: one prepared statement, because every request asks it. */
export function findSignedIn(
  db: UnscopedDb,
  token: { signInId: number; personId: number },
  now: string,
): SignedIn | undefined {
  const row = db
    .prepare(
      `select p.id, p.email, p.name, p.role,
         (select json_group_array(g.branch_id) from person_branches g where g.person_id = p.id) as branches,
         (select json_group_array(r.code) from person_regions g join regions r on r.id = g.region_id
           where g.person_id = p.id) as regions
       from sign_ins s join people p on p.id = s.person_id
       where s.id = ? and s.person_id = ? and ${OPEN}`,
    )
    .get(token.signInId, token.personId, now) as
    | { id: number; email: string; name: string; role: Role; branches: string; regions: string }
    | undefined;
  if (!row) return undefined;
  const { branches, regions, ...person } = row;
  return {
    ...person,
    branchIds: JSON.parse(branches) as number[],
    regionCodes: JSON.parse(regions) as string[],
  };
}

/** Notes the next refresh cookie as issued. */
export function advanceSignIn(
  db: UnscopedDb,
  id: number,
  next: { step: number; at: string; expiresAt: string },
): void {
  db.run(
    sql('sign_ins')
      .where({ id })
      .update({ step: next.step, last_used_at: next.at, expires_at: next.expiresAt }),
  );
}

export function endSignIn(db: UnscopedDb, id: number, at: string): void {
  db.run(sql('sign_ins').where({ id }).whereNull('ended_at').update({ ended_at: at }));
}

/** Ends every sign-in of a person, and tells how many there were; `keptId` stays open. */
export function endSignInsOf(
  db: UnscopedDb,
  personId: number,
  at: string,
  keptId?: number,
): number {
  return db.run(
    sql('sign_ins')
      .where({ person_id: personId })
      .whereNull('ended_at')
      .whereNot({ id: keptId ?? 0 })
      .update({ ended_at: at }),
  ).changes;
}

/** The open sign-ins of a person, last used first. */
export function openSignInsOf(db: UnscopedDb, personId: number, now: string): OpenSignIn[] {
  return db.all<OpenSignIn>(
    sql('sign_ins')
      .where({ person_id: personId })
      .whereNull('ended_at')
      .where('expires_at', '>', now)
      .orderBy([
        { column: 'last_used_at', order: 'desc' },
        { column: 'id', order: 'desc' },
      ])
      .select('id', 'device', { startedAt: 'started_at', lastUsedAt: 'last_used_at' }),
  );
}

/** Every device that a person has signed in from, as far as it is remembered. */
export function devicesOf(db: UnscopedDb, personId: number): string[] {
  return db
    .all<{ device: string }>(sql('sign_ins').where({ person_id: personId }).distinct('device'))
    .map(({ device }) => device);
}

/** Lets go of sign-ins that ended or expired before an instant. */
export function forgetSignIns(db: UnscopedDb, before: string): void {
  db.run(
    sql('sign_ins').where('ended_at', '<', before).orWhere('expires_at', '<', before).delete(),
  );
}
