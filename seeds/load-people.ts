import type { Actor } from '#db/queries/audit';
import { insertPerson } from '#db/queries/people';
import { insertPushKey } from '#db/queries/push-keys';
import type { ScopedBranch } from '#db/scope';
import type { UnscopedDb } from '#db/unscoped-db';
import { randomSecret } from '#server/auth/random-secret';
import { DEMO_PEOPLE, DEMO_PUSH_KEY, managerOf, type DemoPerson } from './demo-people';

/** Makes a stored hash of a password. */
export interface PasswordHasher {
  hash(password: string): Promise<string>;
}

/** A demo person with the hash that stands for their password. */
export interface HashedPerson {
  person: DemoPerson;
  passwordHash: string;
}

/** Who sends for a branch: its system by its key, and the person who mends what it sent wrong. */
export interface Senders {
  system: Actor;
  mender: Actor;
  managerId: number | undefined;
  /** Who marks what was left on cars: the manager, or head office for a branch without one in the demo. */
  marker: Actor & { personId: number };
}

/** Hashes the demo's passwords, before the write that stores them. */
export async function hashPasswords(passwords: PasswordHasher): Promise<HashedPerson[]> {
  const hashed: HashedPerson[] = [];
  for (const person of DEMO_PEOPLE) {
    hashed.push({ person, passwordHash: await passwords.hash(person.password) });
  }
  return hashed;
}

/** Writes the demo's people; gives their ids by e-mail address. Runs inside a write. */
export function loadPeople(
  db: UnscopedDb,
  people: readonly HashedPerson[],
  createdAt: string,
): Map<string, number> {
  return new Map(
    people.map(({ person, passwordHash }) => {
      const { email, name, role, regions, branches } = person;
      const details = { email, name, role, regions, branches, active: true };
      return [email, insertPerson(db, { ...details, passwordHash, createdAt })];
    }),
  );
}

/**
 * Gives every branch's system its push key: the one that everybody knows at Havnsund, one that nobody knows elsewhere. Runs
 * inside a write.
 */
export function loadSenders(
  db: UnscopedDb,
  branches: readonly ScopedBranch[],
  people: ReadonlyMap<string, number>,
  createdAt: string,
): Map<string, Senders> {
  const office = DEMO_PEOPLE.find((person) => person.role === 'head_office');
  const createdBy = people.get(office?.email ?? '');
  if (!office || createdBy === undefined) throw new Error('the demo has nobody at head office');
  return new Map(
    branches.map((branch, index) => {
      const known = branch.code === DEMO_PUSH_KEY.branch;
      const id = known ? DEMO_PUSH_KEY.id : `de31${String(index).padStart(8, '0')}`;
      const secret = known ? DEMO_PUSH_KEY.secret : randomSecret();
      const label = known ? DEMO_PUSH_KEY.label : 'Workshop system';
      insertPushKey(db, { id, secret, branchId: branch.id, label, createdAt, createdBy });
      const system: Actor = {
        label: `key ${id}`,
        personId: null,
        pushKeyId: id,
        address: 'demo data',
      };
      const manager = managerOf(branch.code);
      const managerId = manager && people.get(manager.email);
      const mender: Actor =
        manager && managerId !== undefined ? byHand(manager, managerId) : system;
      const marker =
        manager && managerId !== undefined ? byHand(manager, managerId) : byHand(office, createdBy);
      return [branch.code, { system, mender, managerId, marker }];
    }),
  );
}

function byHand({ email }: DemoPerson, personId: number): Actor & { personId: number } {
  return { label: email, personId, pushKeyId: null, address: 'demo data' };
}
