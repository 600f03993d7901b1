import { recordAudit } from '#db/queries/audit';
import { findLogin, findPerson, setLastSignIn } from '#db/queries/people';
import { devicesOf, forgetSignIns, insertSignIn } from '#db/queries/sign-ins';
import { Refusal } from '#shared/domain/refusal';
import { countAttempt, forgiveAttempts, noteLockOut } from './count-attempt';
import {
  after,
  asActor,
  SIGN_IN_LIVES_MS,
  type Opened,
  type Origin,
  type SignInTools,
} from './sign-in-tools';

/**
 * Opens a sign-in for the right pair of e-mail and password. Every wrong pair gets the same answer after the same work,
 * whether nobody has the address, the password is another, or the person is no longer active.
 */
export async function signIn(
  tools: SignInTools,
  given: { email: string; password: string },
  from: Origin,
): Promise<Opened> {
  const { store, passwords, clock } = tools;
  const db = store.unscoped;
  const attempts = await countAttempt(tools, given.email);
  const login = findLogin(db, given.email);
  const right = await passwords.matches(given.password, login?.passwordHash ?? null);
  if (!right) {
    await noteLockOut(tools, attempts, login, from.address);
    throw wrongPair();
  }
  return store.queue.write(() => {
    // While the password was checked, it may have been changed or its person been turned off.
    const still = findLogin(db, given.email);
    const person = still && findPerson(db, still.id);
    if (!person || still.passwordHash !== login?.passwordHash) throw wrongPair();
    forgiveAttempts(tools, given.email);
    const now = clock.now();
    const at = now.toISOString();
    const expiresAt = after(now, SIGN_IN_LIVES_MS);
    const isNew = isNewDevice(from.device, devicesOf(db, person.id));
    if (person.lastSignInAt !== null && isNew) {
      tools.outbox.queueNewSignIn(person.id, { ...from, at });
    }
    const id = insertSignIn(db, { personId: person.id, device: from.device, at, expiresAt });
    // After the new one, whose number is then the highest: no number is given out twice.
    forgetSignIns(db, after(now, -FORGOTTEN_AFTER_MS));
    setLastSignIn(db, person.id, at);
    recordAudit(db, {
      at,
      actor: asActor(person, from.address),
      action: 'sign-in.start',
      subject: `/sign-ins/${id}`,
      branchId: null,
      detail: { device: from.device },
    });
    return { person, signIn: { id, startedAt: at, step: 1 } };
  });
}

/** Sign-ins that ended or expired so long ago are of no use to anybody; the trail keeps that there were any. */
const FORGOTTEN_AFTER_MS = 90 * 24 * 3600_000;

/** Whether a device was not seen before. Versions do not count: a browser that has been updated is the same one. */
function isNewDevice(device: string, seen: readonly string[]): boolean {
  const withoutVersions = (text: string): string => text.replace(/[\d._]+/g, '');
  return !seen.some((known) => withoutVersions(known) === withoutVersions(device));
}

function wrongPair(): Refusal {
  return new Refusal('unauthenticated', 'E-mail address and password do not belong together.');
}
