import { actorOf } from '#server/auth/caller';
import { randomSecret } from '#server/auth/random-secret';
import { realClock, type Clock } from '#server/clock';
import { mount, type Mounting } from '#server/http/mount';
import type { Kit } from '#server/kit';
import { findPerson, knownPlaces, listPeople } from '#db/queries/people';
import * as contracts from '#shared/contracts/people';
import { addPerson, type PeopleTools } from './add-person';
import { changePerson } from './change-person';
import { inviteAgain } from './invite-again';
import { checkPlacing } from './check-placing';

/** Mounts what head office does with people. */
export function mountPeople(mounting: Mounting, kit: Kit, clock: Clock = realClock): void {
  const { store, passwords, outbox } = kit;
  const tools: PeopleTools = { store, passwords, outbox, newToken: randomSecret };
  const placing = (raw: unknown) => checkPlacing(raw, knownPlaces(store.unscoped));

  mount(
    mounting,
    contracts.addPerson,
    async ({ body, caller, address }) => ({
      body: await addPerson(tools, body, { actor: actorOf(caller, address), now: clock.now() }),
    }),
    { rules: placing },
  );
  mount(mounting, contracts.listPeople, () => ({ body: { items: listPeople(store.unscoped) } }));
  mount(
    mounting,
    contracts.changePerson,
    async ({ params, body, caller, address }) => {
      const { name, role, active, regions = [], branches = [] } = body;
      const details = { name, role, active, regions, branches };
      const deed = { actor: actorOf(caller, address), now: clock.now() };
      return { body: await changePerson(tools, params.id, details, deed) };
    },
    {
      exists: ({ params }) => findPerson(store.unscoped, params.id) !== undefined,
      rules: placing,
    },
  );
  mount(
    mounting,
    contracts.inviteAgain,
    async ({ params, caller, address }) => {
      await inviteAgain(tools, params.id, { actor: actorOf(caller, address), now: clock.now() });
      return {};
    },
    { exists: ({ params }) => findPerson(store.unscoped, params.id) !== undefined },
  );
}
