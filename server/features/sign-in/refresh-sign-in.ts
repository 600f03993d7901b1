import { recordAudit } from '#db/queries/audit';
import { findPerson } from '#db/queries/people';
import { advanceSignIn, endSignIn, findOpenSignIn } from '#db/queries/sign-ins';
import { Refusal } from '#shared/domain/refusal';
import {
  after,
  asActor,
  SIGN_IN_LIVES_MS,
  type Opened,
  type Origin,
  type SignInTools,
} from './sign-in-tools';

/**
 * Exchanges a refresh cookie for its successor (rule 83). The cookie before the newest returns the same successor again, since
 * its answer may have been lost; one older than that has been copied, and its sign-in ends.
 */
export async function refreshSignIn(
  tools: SignInTools,
  cookieHeader: string | undefined,
  from: Origin,
): Promise<Opened> {
  const shown = tools.cookies.read(cookieHeader);
  const opened =
    shown && (await tools.store.queue.write(() => takeStep(tools, shown, from.address)));
  // Refused outside the write, so that the end of a copied sign-in is kept.
  if (!opened) throw new Refusal('unauthenticated', 'This sign-in has ended. Sign in again.');
  return opened;
}

function takeStep(
  tools: SignInTools,
  shown: { signInId: number; step: number; mac: string },
  address: string,
): Opened | undefined {
  const db = tools.store.unscoped;
  const now = tools.clock.now();
  const at = now.toISOString();
  const signIn = findOpenSignIn(db, shown.signInId, at);
  if (!signIn || !tools.cookies.verifies(shown, signIn) || shown.step > signIn.step) return;
  const person = findPerson(db, signIn.personId);
  if (!person) return;
  if (shown.step < signIn.step - 1) {
    endSignIn(db, signIn.id, at);
    recordAudit(db, {
      at,
      actor: asActor(person, address),
      action: 'sign-in.reused-cookie',
      subject: `/sign-ins/${signIn.id}`,
      branchId: null,
      detail: { shown: shown.step, newest: signIn.step },
    });
    return;
  }
  const step = shown.step + 1;
  advanceSignIn(db, signIn.id, { step, at, expiresAt: after(now, SIGN_IN_LIVES_MS) });
  return { person, signIn: { id: signIn.id, startedAt: signIn.startedAt, step } };
}
