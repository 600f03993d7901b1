import { recordAudit } from '#db/queries/audit';
import { findPerson } from '#db/queries/people';
import { endSignIn, endSignInsOf, findOpenSignIn } from '#db/queries/sign-ins';
import { asActor, type Origin, type SignInTools } from './sign-in-tools';

/** Ends the sign-in of a refresh cookie; nothing happens when there is none or it has ended. */
export async function signOut(
  tools: SignInTools,
  cookieHeader: string | undefined,
  from: Origin,
): Promise<void> {
  const { store, cookies, clock } = tools;
  const db = store.unscoped;
  const shown = cookies.read(cookieHeader);
  if (!shown) return;
  await store.queue.write(() => {
    const at = clock.now().toISOString();
    const signIn = findOpenSignIn(db, shown.signInId, at);
    const person = signIn && findPerson(db, signIn.personId);
    if (!signIn || !person || !cookies.verifies(shown, signIn)) return;
    endSignIn(db, signIn.id, at);
    recordAudit(db, {
      at,
      actor: asActor(person, from.address),
      action: 'sign-in.end',
      subject: `/sign-ins/${signIn.id}`,
      branchId: null,
      detail: {},
    });
  });
}

/** Signs a person out everywhere. */
export async function endEverySignIn(
  tools: SignInTools,
  person: { id: number; email: string },
  from: Origin,
): Promise<void> {
  const { store, clock } = tools;
  await store.queue.write(() => {
    const at = clock.now().toISOString();
    const ended = endSignInsOf(store.unscoped, person.id, at);
    recordAudit(store.unscoped, {
      at,
      actor: asActor(person, from.address),
      action: 'sign-in.end-all',
      subject: `/people/${person.id}`,
      branchId: null,
      detail: { ended },
    });
  });
}
