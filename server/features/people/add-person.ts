import { recordAudit, type Actor } from '#db/queries/audit';
import { insertPasswordToken } from '#db/queries/password-tokens';
import { emailTaken, findPerson, insertPerson, knownPlaces, type Person } from '#db/queries/people';
import type { Store } from '#db/store';
import type { Role } from '#shared/domain/vocabulary';
import { Refusal, refuseInput } from '#shared/domain/refusal';
import { checkPlacing } from './check-placing';

/** How long the link of an invitation works. */
export const INVITATION_LIVES_MS = 7 * 24 * 3600_000;

/** What adding a person is given; `outbox` and `newToken` are used only when there is no password. */
export interface PeopleTools {
  store: Store;
  passwords: { hash(password: string): Promise<string> };
  outbox: { queueInvitation(to: { email: string; name: string }, token: string): void };
  /** A new one-time token. */
  newToken: () => string;
}

/** A person to add, of the shape that the contract `addPerson` has checked. */
export interface NewPerson {
  email: string;
  name: string;
  role: Role;
  regions?: readonly string[] | undefined;
  branches?: readonly string[] | undefined;
  /** Absent: an invitation is mailed. */
  password?: string | undefined;
}

/** Who does it, and when. */
export interface Deed {
  actor: Actor;
  now: Date;
}

/**
 * Adds a person, at a call of head office or from the command line. Refuses a placing that does not fit the role and an e-mail
 * address that somebody has already (rule 65).
 */
export async function addPerson(
  tools: PeopleTools,
  given: NewPerson,
  { actor, now }: Deed,
): Promise<Person> {
  const { store, passwords, outbox, newToken } = tools;
  const db = store.unscoped;
  const { email, name, role, regions = [], branches = [], password } = given;
  if (emailTaken(db, email)) throw taken();
  const passwordHash = password === undefined ? null : await passwords.hash(password);
  return store.queue.write(() => {
    const problems = checkPlacing(given, knownPlaces(db));
    if (problems.length > 0) throw refuseInput(problems);
    if (emailTaken(db, email)) throw taken();
    const at = now.toISOString();
    const details = { email, name, role, regions, branches, active: true };
    const id = insertPerson(db, { ...details, passwordHash, createdAt: at });
    const person = findPerson(db, id)!;
    recordAudit(db, {
      at,
      actor,
      action: 'person.add',
      subject: `/people/${id}`,
      branchId: null,
      detail: { before: null, after: details, invited: person.invited },
    });
    if (person.invited) {
      const token = newToken();
      const expiresAt = new Date(now.getTime() + INVITATION_LIVES_MS).toISOString();
      insertPasswordToken(db, { token, personId: id, purpose: 'invitation', expiresAt });
      outbox.queueInvitation(person, token);
    }
    return person;
  });
}

function taken(): Refusal {
  return new Refusal('conflict', 'Somebody already signs in with this e-mail address.');
}
