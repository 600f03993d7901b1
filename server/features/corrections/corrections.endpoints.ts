import { BranchWriter } from '#db/branch-writer';
import {
  getJobChanges,
  listVoidedJobs,
  restoreJob as contract,
} from '#shared/contracts/corrections';
import { tagOf } from '#shared/domain/preconditions';
import { actorOf, moneyFor, personIdOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, namedBranch, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { listVoided } from './list-voided';
import { restoreJob } from './restore-job';
import { tellChanges } from './tell-changes';
import { voidedPlace } from './voided-place';

/** What changed in a job, what was voided, and its way back. */
export function mountCorrections(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(mounting, getJobChanges, (call) => {
    const { jobRef } = call.params;
    const asked = { branch: namedBranch(call).code, jobRef, ...call.query };
    return { body: tellChanges(store.scoped(call.scope), asked, moneyFor(call.caller)) };
  });

  mount(mounting, contract, async (call) => {
    const writer = new BranchWriter(store, namedBranch(call));
    const restored = await store.queue.write(
      () =>
        restoreJob(writer, call.params.jobRef, call.ifMatch, {
          actor: actorOf(call.caller, call.address),
          source: 'person',
          receivedAt: realClock.now().toISOString(),
        }),
      personIdOf(call.caller),
    );
    return { body: restored, headers: { ETag: tagOf(restored.revision) } };
  });

  mount(mounting, listVoidedJobs, (call) => {
    const { limit, cursor } = call.query;
    const asked = { after: placeOf(cursor, voidedPlace), limit };
    const { items, next } = listVoided(store.scoped(call.scope), namedBranch(call).code, asked);
    return { body: { items, nextCursor: next && cursorOf(next) } };
  });
}
