import { recordAudit } from '#db/queries/audit';
import { insertPasswordToken, useUpTokensOf } from '#db/queries/password-tokens';
import { findPerson } from '#db/queries/people';
import { notFound, Refusal } from '#shared/domain/refusal';
import { INVITATION_LIVES_MS, type Deed, type PeopleTools } from './add-person';

/** Mails the invitation of a person once more; links mailed before stop working. */
export async function inviteAgain(
  { store, outbox, newToken }: Omit<PeopleTools, 'passwords'>,
  id: number,
  { actor, now }: Deed,
): Promise<void> {
  const db = store.unscoped;
  const token = newToken();
  await store.queue.write(() => {
    const person = findPerson(db, id);
    if (!person) throw notFound();
    if (!person.active) {
      throw new Refusal('conflict', `${person.name} is not active; turn the sign-in on first.`);
    }
    if (!person.invited) {
      throw new Refusal(
        'conflict',
        `${person.name} has a password already and needs no invitation.`,
      );
    }
    const at = now.toISOString();
    useUpTokensOf(db, id, at);
    const expiresAt = new Date(now.getTime() + INVITATION_LIVES_MS).toISOString();
    insertPasswordToken(db, { token, personId: id, purpose: 'invitation', expiresAt });
    outbox.queueInvitation(person, token);
    recordAudit(db, {
      at,
      actor,
      action: 'person.invite',
      subject: `/people/${id}`,
      branchId: null,
      detail: { to: person.email },
    });
  });
}
