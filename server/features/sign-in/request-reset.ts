import { recordAudit } from '#db/queries/audit';
import { insertPasswordToken } from '#db/queries/password-tokens';
import { emailKey, findLogin } from '#db/queries/people';
import { findAttempts, keepAttempts } from '#db/queries/sign-in-failures';
import { after, asActor, type Origin, type SignInTools } from './sign-in-tools';

const TOKEN_LIVES_MS = 3600_000;
/** Mails to one address within the window, so that nobody's mailbox can be flooded from here. */
const MOST_MAILS = 3;
const WINDOW_MS = 15 * 60_000;

/**
 * Mails a link to set a new password, if an active person has the address. Answers alike in any case, and both cases end in
 * one durable commit, so that time tells nothing either.
 */
export async function requestReset(tools: SignInTools, email: string, from: Origin): Promise<void> {
  const { store, outbox, newToken, clock } = tools;
  const db = store.unscoped;
  const token = newToken();
  await store.queue.write(() => {
    const now = clock.now();
    const at = now.toISOString();
    const tooMany = countMail(tools, email, now) > MOST_MAILS;
    const login = findLogin(db, email);
    if (!login || tooMany) return;
    insertPasswordToken(db, {
      token,
      personId: login.id,
      purpose: 'reset',
      expiresAt: after(now, TOKEN_LIVES_MS),
    });
    outbox.queueReset(login, token);
    recordAudit(db, {
      at,
      actor: { label: 'nobody signed in', personId: null, pushKeyId: null, address: from.address },
      action: 'password.reset-request',
      subject: `/people/${login.id}`,
      branchId: null,
      detail: { to: asActor(login, from.address).label },
    });
  });
}

function countMail(tools: SignInTools, email: string, now: Date): number {
  const db = tools.store.unscoped;
  const name = `reset ${emailKey(email)}`;
  const before = findAttempts(db, name);
  const fresh = !before || before.firstAt <= after(now, -WINDOW_MS);
  const mails = fresh ? 1 : before.failures + 1;
  const firstAt = fresh ? now.toISOString() : before.firstAt;
  keepAttempts(db, name, { failures: mails, firstAt, lockedUntil: null });
  return mails;
}
