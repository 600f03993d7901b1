import { recordAudit } from '#db/queries/audit';
import { findPerson, renamePerson, type Person } from '#db/queries/people';
import { notFound } from '#shared/domain/refusal';
import { asActor, type Origin, type SignInTools } from './sign-in-tools';

/** Changes a person's own name. */
export async function changeName(
  tools: Pick<SignInTools, 'store' | 'clock'>,
  personId: number,
  name: string,
  from: Origin,
): Promise<Person> {
  const { store, clock } = tools;
  const db = store.unscoped;
  return store.queue.write(() => {
    const before = findPerson(db, personId);
    if (!before) throw notFound();
    renamePerson(db, personId, name);
    recordAudit(db, {
      at: clock.now().toISOString(),
      actor: asActor(before, from.address),
      action: 'person.rename',
      subject: `/people/${personId}`,
      branchId: null,
      detail: { before: before.name, after: name },
    });
    return { ...before, name };
  });
}
