import { recordAudit } from '#db/queries/audit';
import { keepMailChoice, listMailChoices, wantsMail } from '#db/queries/mail-choices';
import { findPerson } from '#db/queries/people';
import type { Store } from '#db/store';
import type { Unsubscription } from '#shared/contracts/unsubscribe';
import type { MailKind } from '#shared/domain/mail-kinds';
import { notFound } from '#shared/domain/refusal';

/** What a signed link says: whose mail of which kind. */
export interface StopAsked {
  personId: number;
  kind: MailKind;
}

/** Which mail a link stops, and whether it still comes; somebody who is not known any more is answered as a bad link is. */
export function readStanding(store: Store, asked: StopAsked | undefined): Unsubscription {
  const db = store.unscoped;
  const person = asked && findPerson(db, asked.personId);
  if (!asked || !person) throw notFound();
  return { kind: asked.kind, wanted: wantsMail(db, person, asked.kind) };
}

/** Stops a kind of mail for the person whom the link was made for, and says so in the trail; asked twice, once. */
export async function stopMail(
  store: Store,
  asked: StopAsked | undefined,
  from: { at: string; address: string },
): Promise<Unsubscription> {
  const db = store.unscoped;
  const { kind } = readStanding(store, asked);
  await store.queue.write(() => {
    const person = asked && findPerson(db, asked.personId);
    if (!person) return;
    const before = listMailChoices(db, person);
    const wanted = before.some((choice) => choice.kind === kind && choice.wanted);
    // Kept also for a role that does not receive it just now: it stays stopped should it be theirs again.
    keepMailChoice(db, person.id, { kind, wanted: false });
    if (!wanted) return;
    recordAudit(db, {
      at: from.at,
      actor: { label: person.email, personId: person.id, pushKeyId: null, address: from.address },
      action: 'person.mails',
      subject: `/people/${person.id}`,
      branchId: null,
      detail: {
        before: byKind(before),
        after: byKind(listMailChoices(db, person)),
        how: 'link in a mail',
      },
    });
  });
  return readStanding(store, asked);
}

function byKind(choices: ReturnType<typeof listMailChoices>): Record<string, boolean> {
  return Object.fromEntries(choices.map(({ kind, wanted }) => [kind, wanted]));
}
