import { recordAudit } from '#db/queries/audit';
import { keepMailChoice, listMailChoices, type MailChoice } from '#db/queries/mail-choices';
import { refuseInput } from '#shared/domain/refusal';
import type { Role } from '#shared/domain/vocabulary';
import { asActor, type Origin, type SignInTools } from './sign-in-tools';

/** Keeps which mails a person wants; kinds left out stay as they are. Refuses a kind that their role does not receive. */
export async function chooseMails(
  { store, clock }: Pick<SignInTools, 'store' | 'clock'>,
  person: { id: number; email: string; role: Role },
  chosen: readonly MailChoice[],
  from: Origin,
): Promise<MailChoice[]> {
  const db = store.unscoped;
  return store.queue.write(() => {
    const before = listMailChoices(db, person);
    const problems = chosen.flatMap(({ kind }, index) =>
      before.some((choice) => choice.kind === kind)
        ? []
        : [{ path: `/items/${index}/kind`, message: 'is no mail that your role receives' }],
    );
    if (problems.length > 0) throw refuseInput(problems);
    for (const choice of chosen) keepMailChoice(db, person.id, choice);
    const after = listMailChoices(db, person);
    if (JSON.stringify(after) !== JSON.stringify(before)) {
      recordAudit(db, {
        at: clock.now().toISOString(),
        actor: asActor(person, from.address),
        action: 'person.mails',
        subject: `/people/${person.id}`,
        branchId: null,
        detail: { before: byKind(before), after: byKind(after) },
      });
    }
    return after;
  });
}

function byKind(choices: readonly MailChoice[]): Record<string, boolean> {
  return Object.fromEntries(choices.map(({ kind, wanted }) => [kind, wanted]));
}
