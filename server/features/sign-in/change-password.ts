import { recordAudit } from '#db/queries/audit';
import { useUpTokensOf } from '#db/queries/password-tokens';
import { findLogin, setPasswordHash } from '#db/queries/people';
import { endSignInsOf } from '#db/queries/sign-ins';
import { Refusal, refuseInput } from '#shared/domain/refusal';
import { countAttempt, forgiveAttempts, noteLockOut } from './count-attempt';
import { asActor, type Origin, type SignInTools } from './sign-in-tools';

/**
 * Changes a person's own password; every other sign-in of theirs ends and mailed links stop working. A wrong current password
 * counts as a failed sign-in, so that a stolen token cannot be used to guess it.
 */
export async function changePassword(
  tools: SignInTools,
  person: { id: number; email: string; signInId: number },
  given: { currentPassword: string; newPassword: string },
  from: Origin,
): Promise<void> {
  const { store, passwords, clock } = tools;
  const db = store.unscoped;
  const attempts = await countAttempt(tools, person.email);
  const before = findLogin(db, person.email)?.passwordHash ?? null;
  if (!(await passwords.matches(given.currentPassword, before))) {
    await noteLockOut(tools, attempts, person, from.address);
    throw refuseInput([{ path: '/currentPassword', message: 'is not the current password' }]);
  }
  const hash = await passwords.hash(given.newPassword);
  await store.queue.write(() => {
    if (findLogin(db, person.email)?.passwordHash !== before) {
      throw new Refusal('conflict', 'The password was changed from elsewhere at this moment.');
    }
    const at = clock.now().toISOString();
    forgiveAttempts(tools, person.email);
    setPasswordHash(db, person.id, hash);
    useUpTokensOf(db, person.id, at);
    tools.outbox.queuePasswordChanged(person.id, { at, address: from.address });
    const ended = endSignInsOf(db, person.id, at, person.signInId);
    recordAudit(db, {
      at,
      actor: asActor(person, from.address),
      action: 'password.change',
      subject: `/people/${person.id}`,
      branchId: null,
      detail: { otherSignInsEnded: ended },
    });
  });
}
