import { recordAudit } from '#db/queries/audit';
import { useUpTokensOf } from '#db/queries/password-tokens';
import {
  findPerson,
  hasOtherHeadOffice,
  knownPlaces,
  updatePerson,
  type Person,
  type PersonDetails,
} from '#db/queries/people';
import { endSignInsOf } from '#db/queries/sign-ins';
import type { Store } from '#db/store';
import { notFound, refuseInput } from '#shared/domain/refusal';
import type { Deed } from './add-person';
import { checkPlacing } from './check-placing';

/**
 * Changes what a person is; it counts from their next request on (rule 64). A person turned off is signed out everywhere.
 * Refuses to leave a network without anybody of head office who can sign in.
 */
export async function changePerson(
  tools: { store: Store },
  id: number,
  details: PersonDetails,
  { actor, now }: Deed,
): Promise<Person> {
  const db = tools.store.unscoped;
  return tools.store.queue.write(() => {
    const before = findPerson(db, id);
    if (!before) throw notFound();
    const problems = [
      ...checkPlacing(details, knownPlaces(db)),
      ...checkHeadOffice(before, details, hasOtherHeadOffice(db, id)),
    ];
    if (problems.length > 0) throw refuseInput(problems);
    const at = now.toISOString();
    updatePerson(db, id, details);
    if (before.active && !details.active) {
      endSignInsOf(db, id, at);
      useUpTokensOf(db, id, at);
    }
    const after = findPerson(db, id)!;
    recordAudit(db, {
      at,
      actor,
      action: 'person.change',
      subject: `/people/${id}`,
      branchId: null,
      detail: { before: traced(before), after: traced(after) },
    });
    return after;
  });
}

function checkHeadOffice(before: Person, details: PersonDetails, others: boolean) {
  const wasOne = before.role === 'head_office' && before.active;
  if (!wasOne || others || (details.role === 'head_office' && details.active)) return [];
  return [
    {
      path: details.active ? '/role' : '/active',
      message: 'this is the last person of head office who can sign in; add another one first',
    },
  ];
}

function traced({ name, role, regions, branches, active }: Person): PersonDetails {
  return { name, role, regions, branches, active };
}
