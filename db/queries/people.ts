import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';
import type { Role } from '#shared/domain/vocabulary';

/** A person as head office sees them; regions and branches are the codes of what they were given. */
export interface Person {
  id: number;
  email: string;
  name: string;
  role: Role;
  regions: string[];
  branches: string[];
  active: boolean;
  /** Has not set a password yet. */
  invited: boolean;
  lastSignInAt: string | null;
}

/** What a person is: everything about them that head office decides. */
export interface PersonDetails {
  name: string;
  role: Role;
  regions: readonly string[];
  branches: readonly string[];
  active: boolean;
}

/** What signing in needs to know of a person. */
export interface Login {
  id: number;
  email: string;
  name: string;
  passwordHash: string | null;
}

interface PersonRow {
  id: number;
  email: string;
  name: string;
  role: Role;
  active: number;
  invited: number;
  last_sign_in_at: string | null;
  regions: string;
  branches: string;
}

const PERSON = `
  select p.id, p.email, p.name, p.role, p.active, p.password_hash is null as invited, p.last_sign_in_at,
    (select json_group_array(code) from (select r.code from person_regions g join regions r on r.id = g.region_id
      where g.person_id = p.id order by r.code)) as regions,
    (select json_group_array(code) from (select b.code from person_branches g join branches b on b.id = g.branch_id
      where g.person_id = p.id order by b.code)) as branches
  from people p`;

/** What makes two spellings the same address: Unicode NFC, no space at the edges, no difference of case (rule 65). */
export function emailKey(email: string): string {
  return email.normalize('NFC').trim().toLowerCase();
}

export function findPerson(db: UnscopedDb, id: number): Person | undefined {
  const row = db.prepare(`${PERSON} where p.id = ?`).get(id) as PersonRow | undefined;
  return row && personOf(row);
}

/** Everybody, by e-mail address. */
export function listPeople(db: UnscopedDb): Person[] {
  return (db.prepare(`${PERSON} order by p.email_key`).all() as PersonRow[]).map(personOf);
}

/** The active person who signs in with an address. */
export function findLogin(db: UnscopedDb, email: string): Login | undefined {
  return db.first<Login>(
    sql('people')
      .where({ email_key: emailKey(email), active: 1 })
      .select('id', 'email', 'name', { passwordHash: 'password_hash' }),
  );
}

export function emailTaken(db: UnscopedDb, email: string): boolean {
  return (
    db.first(
      sql('people')
        .where({ email_key: emailKey(email) })
        .select('id'),
    ) !== undefined
  );
}

/** Adds a person; without a password hash they are invited. Returns their id. */
export function insertPerson(
  db: UnscopedDb,
  person: PersonDetails & { email: string; passwordHash: string | null; createdAt: string },
): number {
  const { id } = db.run(
    sql('people').insert({
      email: person.email.normalize('NFC').trim(),
      email_key: emailKey(person.email),
      name: person.name,
      role: person.role,
      password_hash: person.passwordHash,
      active: person.active ? 1 : 0,
      created_at: person.createdAt,
    }),
  );
  givePlaces(db, id, person);
  return id;
}

export function updatePerson(db: UnscopedDb, id: number, person: PersonDetails): void {
  const { name, role, active } = person;
  db.run(
    sql('people')
      .where({ id })
      .update({ name, role, active: active ? 1 : 0 }),
  );
  givePlaces(db, id, person);
}

export function renamePerson(db: UnscopedDb, id: number, name: string): void {
  db.run(sql('people').where({ id }).update({ name }));
}

export function setPasswordHash(db: UnscopedDb, id: number, hash: string): void {
  db.run(sql('people').where({ id }).update({ password_hash: hash }));
}

export function setLastSignIn(db: UnscopedDb, id: number, at: string): void {
  db.run(sql('people').where({ id }).update({ last_sign_in_at: at }));
}

/** Whether somebody else of head office can sign in: active, and with a password. */
export function hasOtherHeadOffice(db: UnscopedDb, id: number): boolean {
  return (
    db.first(
      sql('people')
        .where({ role: 'head_office', active: 1 })
        .whereNot({ id })
        .whereNotNull('password_hash')
        .select('id'),
    ) !== undefined
  );
}

/** The codes that a person can be given. */
export function knownPlaces(db: UnscopedDb): { regions: Set<string>; branches: Set<string> } {
  const codes = (table: string) =>
    new Set(db.all<{ code: string }>(sql(table).select('code')).map((row) => row.code));
  return { regions: codes('regions'), branches: codes('branches') };
}

function givePlaces(db: UnscopedDb, id: number, person: PersonDetails): void {
  db.run(sql('person_regions').where({ person_id: id }).delete());
  db.run(sql('person_branches').where({ person_id: id }).delete());
  const give = (grants: string, column: string, places: string) =>
    db.prepare(`insert or ignore into ${grants} (person_id, ${column})
      select ?, id from ${places} where code = ?`);
  for (const code of person.regions) give('person_regions', 'region_id', 'regions').run(id, code);
  for (const code of person.branches) {
    give('person_branches', 'branch_id', 'branches').run(id, code);
  }
}

function personOf(row: PersonRow): Person {
  return {
    id: row.id,
    email: row.email,
    name: row.name,
    role: row.role,
    regions: JSON.parse(row.regions) as string[],
    branches: JSON.parse(row.branches) as string[],
    active: row.active === 1,
    invited: row.invited === 1,
    lastSignInAt: row.last_sign_in_at,
  };
}
