import { recordAudit } from '#db/queries/audit';
import { emailKey } from '#db/queries/people';
import {
  clearAttempts,
  findAttempts,
  forgetAttempts,
  keepAttempts,
  type Attempts,
} from '#db/queries/sign-in-failures';
import { Refusal } from '#shared/domain/refusal';
import { after, asActor, type SignInTools } from './sign-in-tools';

/** Failures within the window that lock an e-mail address out, for as long again. */
const MOST_FAILURES = 10;
const WINDOW_MS = 15 * 60_000;

/**
 * Counts an attempt at the password of an e-mail address before it is checked, so that many at once count too; a success
 * takes the count back. Refuses while the address is locked out, whether or not anybody has it.
 */
export async function countAttempt(
  tools: Pick<SignInTools, 'store' | 'clock'>,
  email: string,
): Promise<Attempts> {
  const db = tools.store.unscoped;
  const now = tools.clock.now();
  const name = emailKey(email);
  const attempts = await tools.store.queue.write(() => {
    forgetAttempts(db, after(now, -WINDOW_MS), now.toISOString());
    const before = findAttempts(db, name);
    const until = before?.lockedUntil ?? '';
    if (until > now.toISOString()) return until;
    const attempts = counted(before, now);
    keepAttempts(db, name, attempts);
    return attempts;
  });
  if (typeof attempts === 'string') {
    const seconds = Math.ceil((Date.parse(attempts) - now.getTime()) / 1000);
    throw new Refusal(
      'too-many',
      'Too many wrong passwords for this e-mail address. Wait a quarter of an hour, or ask for a new password.',
      [],
      seconds,
    );
  }
  return attempts;
}

/** Puts a lock-out into the trail, once the attempt that caused it has proved wrong. */
export async function noteLockOut(
  tools: Pick<SignInTools, 'store' | 'clock'>,
  attempts: Attempts,
  person: { id: number; email: string } | undefined,
  address: string,
): Promise<void> {
  const { lockedUntil, failures } = attempts;
  // An address that nobody has stays out: what was typed there may be a password.
  if (lockedUntil === null || !person) return;
  await tools.store.queue.write(() =>
    recordAudit(tools.store.unscoped, {
      at: tools.clock.now().toISOString(),
      actor: asActor(person, address),
      action: 'sign-in.lock-out',
      subject: `/people/${person.id}`,
      branchId: null,
      detail: { failures, until: lockedUntil },
    }),
  );
}

/** Takes the count back after a right password; inside a write. */
export function forgiveAttempts(tools: Pick<SignInTools, 'store'>, email: string): void {
  clearAttempts(tools.store.unscoped, emailKey(email));
}

function counted(before: Attempts | undefined, now: Date): Attempts {
  const stale = !before || before.lockedUntil !== null || before.firstAt <= after(now, -WINDOW_MS);
  const failures = stale ? 1 : before.failures + 1;
  return {
    failures,
    firstAt: stale ? now.toISOString() : before.firstAt,
    lockedUntil: failures >= MOST_FAILURES ? after(now, WINDOW_MS) : null,
  };
}
