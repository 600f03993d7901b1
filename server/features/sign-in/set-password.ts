import { recordAudit } from '#db/queries/audit';
import { findTokenHolder, useUpTokensOf } from '#db/queries/password-tokens';
import { setPasswordHash } from '#db/queries/people';
import { endSignInsOf } from '#db/queries/sign-ins';
import { refuseInput, type Refusal } from '#shared/domain/refusal';
import { forgiveAttempts } from './count-attempt';
import { asActor, type Origin, type SignInTools } from './sign-in-tools';

/**
 * Sets a password with the token of an invitation or reset mail. The token works once; every sign-in of the person ends, all
 * their other tokens stop working, and a lock-out is lifted: who reads the mailbox is who they say.
 */
export async function setPassword(
  tools: SignInTools,
  given: { token: string; newPassword: string },
  from: Origin,
): Promise<void> {
  const { store, passwords, clock } = tools;
  const db = store.unscoped;
  const holder = () => {
    const found = findTokenHolder(db, given.token, clock.now().toISOString());
    if (!found) throw worthless();
    return found;
  };
  // Before the hash, so that a worthless token costs nothing.
  holder();
  const hash = await passwords.hash(given.newPassword);
  await store.queue.write(() => {
    const { personId, email, purpose } = holder();
    const at = clock.now().toISOString();
    setPasswordHash(db, personId, hash);
    useUpTokensOf(db, personId, at);
    forgiveAttempts(tools, email);
    // Whoever is invited has just been mailed, and has no earlier password.
    if (purpose === 'reset') {
      tools.outbox.queuePasswordChanged(personId, { at, address: from.address });
    }
    const ended = endSignInsOf(db, personId, at);
    recordAudit(db, {
      at,
      actor: asActor({ id: personId, email }, from.address),
      action: 'password.set',
      subject: `/people/${personId}`,
      branchId: null,
      detail: { by: purpose, signInsEnded: ended },
    });
  });
}

function worthless(): Refusal {
  return refuseInput([
    {
      path: '/token',
      message: 'this link was used already or is too old; ask for a new one on the sign-in page',
    },
  ]);
}
