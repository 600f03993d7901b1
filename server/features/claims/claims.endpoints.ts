import { ClaimWriter, type StoredClaim } from '#db/claim-writer';
import { findClaim } from '#db/queries/claims';
import { readNetwork } from '#db/queries/network';
import type { ScopedBranch } from '#db/scope';
import { getClaim, putClaim, putClaimBatch } from '#shared/contracts/claims';
import { localDate } from '#shared/domain/calendar';
import { breaksOfClaim } from '#shared/domain/claim-rules';
import { notFound } from '#shared/domain/refusal';
import { actorOf, personIdOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import { checkPreconditions, tagOf } from '#shared/domain/preconditions';
import type { Kit } from '../../kit';
import { acceptClaim, type ClaimSending } from '#db/accept-claim';
import { breaksAgainstJob } from '#db/breaks-against-job';
import { acceptClaimBatch } from './accept-claim-batch';

/** Claims under warranty: sent, corrected, read. */
export function mountClaims(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const today = (branch: ScopedBranch): string => localDate(kit.clock.now(), branch.timeZone);

  mount(
    mounting,
    putClaim,
    async (call) => {
      const writer = new ClaimWriter(store, namedBranch(call));
      const accepted = await store.queue.write(
        () =>
          acceptClaim(writer, call.params.claimRef, call.body, {
            ...sendingOf(kit, call),
            precondition: (stored: StoredClaim | undefined) =>
              checkPreconditions(
                {
                  ifMatch: call.ifMatch,
                  ifNoneMatch: call.ifNoneMatch,
                  lastChange: () => stored && writer.lastChange(stored.id),
                },
                stored && { revision: stored.revision, voided: false },
              ),
          }),
        personIdOf(call.caller),
      );
      return {
        status: accepted.status === 'created' ? 201 : 200,
        body: accepted,
        headers: { ETag: tagOf(accepted.revision) },
      };
    },
    {
      rules: (raw, { branch }) =>
        branch
          ? [
              ...breaksOfClaim(raw, today(branch)),
              ...breaksAgainstJob(new ClaimWriter(store, branch), raw),
            ]
          : [],
    },
  );

  mount(mounting, putClaimBatch, async (call) => {
    const branch = namedBranch(call);
    return {
      body: await acceptClaimBatch(
        store,
        branch,
        call.body.claims,
        today(branch),
        sendingOf(kit, call),
      ),
    };
  });

  mount(mounting, getClaim, (call) => {
    const branch = namedBranch(call);
    const found = findClaim(store.scoped(call.scope), branch.code, call.params.claimRef);
    if (!found) throw notFound();
    const { costCents = 0, ...content } = found.content;
    const unseen = call.caller?.kind === 'person' && call.caller.role === 'recorder';
    return {
      body: {
        labourMinutes: 0,
        productMl: 0,
        ...content,
        // A branch's system that knows of no decision takes nothing from the one that stands, nor its days.
        ...(found.proposed === null && {
          decidedOn: found.decidedOn ?? content.decidedOn,
          paidOn: found.paidOn ?? content.paidOn,
        }),
        decision: found.decision,
        ...(found.proposed !== null && { proposedDecision: found.proposed }),
        ...(!unseen && { costCents }),
        branch: branch.code,
        claimRef: call.params.claimRef,
        revision: found.revision,
      },
      headers: { ETag: tagOf(found.revision) },
    };
  });
}

function sendingOf(kit: Kit, call: Call): ClaimSending {
  const { caller } = call;
  return {
    actor: actorOf(caller, call.address),
    source: caller?.kind === 'key' ? 'key' : 'person',
    receivedAt: realClock.now().toISOString(),
    role: caller?.kind === 'person' ? caller.role : 'site_manager',
    limitCents: readNetwork(kit.store.unscoped).claimLimitCents,
  };
}
