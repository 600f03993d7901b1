import { BranchWriter } from '#db/branch-writer';
import type { ScopedBranch } from '#db/scope';
import { billJob, getJob, putJob, putJobBatch, voidJob } from '#shared/contracts/jobs';
import { localDate } from '#shared/domain/calendar';
import { breaksOfJob, type JobWorld } from '#shared/domain/job-rules';
import { notFound } from '#shared/domain/refusal';
import { actorOf, moneyFor, type Caller, personIdOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { acceptBatch } from './accept-batch';
import { acceptJob, type Sending } from '#db/accept-job';
import { breaksOfBill, writeBill } from './bill-job';
import { breaksOfClaims } from '#db/breaks-of-claims';
import { worldOf } from '#shared/contracts/check-job';
import { checkPreconditions, tagOf } from '#shared/domain/preconditions';
import { readJobSheet } from './read-job-sheet';

/** Jobs: sent, corrected, read, billed and voided. */
export function mountJobs(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const world = (branch: ScopedBranch, caller: Caller | undefined): JobWorld =>
    worldOf(store.state, localDate(kit.clock.now(), branch.timeZone), moneyFor(caller));

  mount(
    mounting,
    putJob,
    async (call) => {
      const branch = namedBranch(call);
      const accepted = await store.queue.write(
        () =>
          acceptJob(new BranchWriter(store, branch), call.params.jobRef, call.body, {
            ...sendingOf(kit, call, call.params.jobRef),
            source: sourceOf(call),
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
      rules: (raw, { branch, caller, params }) =>
        branch
          ? [
              ...breaksOfJob(raw, world(branch, caller)),
              ...(params
                ? breaksOfClaims(new BranchWriter(store, branch), params.jobRef, raw)
                : []),
            ]
          : [],
    },
  );

  mount(mounting, putJobBatch, async (call) => {
    const branch = namedBranch(call);
    const sending = { ...sendingOf(kit, call, ''), preconditions: NONE };
    const rules = world(branch, call.caller);
    return { body: await acceptBatch(store, branch, call.body.jobs, rules, sending) };
  });

  mount(mounting, getJob, (call) => {
    const sheet = readJobSheet(
      store.scoped(call.scope),
      namedBranch(call).code,
      call.params.jobRef,
      store.state.costs,
      moneyFor(call.caller),
    );
    return { body: sheet, headers: { ETag: tagOf(sheet.revision) } };
  });

  mount(mounting, voidJob, async (call) => {
    const branch = namedBranch(call);
    await store.queue.write(() => {
      const writer = new BranchWriter(store, branch);
      const stored = writer.findJob(call.params.jobRef);
      if (!stored || stored.voided) throw notFound();
      const sending = sendingOf(kit, call, call.params.jobRef);
      checkPreconditions(sending.preconditions, stored);
      writer.voidJob(call.params.jobRef, stored, sending);
    }, personIdOf(call.caller));
    return {};
  });

  mount(
    mounting,
    billJob,
    async (call) => {
      const branch = namedBranch(call);
      const accepted = await store.queue.write(
        () =>
          writeBill(
            new BranchWriter(store, branch),
            call.params.jobRef,
            call.body,
            sendingOf(kit, call, call.params.jobRef),
          ),
        personIdOf(call.caller),
      );
      return { body: accepted, headers: { ETag: tagOf(accepted.revision) } };
    },
    {
      exists: ({ branch, params }) => {
        const stored = branch && new BranchWriter(store, branch).findJob(params.jobRef);
        return stored !== undefined && !stored.voided;
      },
      rules: (raw, { branch, params }) => {
        const stored = branch && params && new BranchWriter(store, branch).findJob(params.jobRef);
        return stored ? breaksOfBill(raw, stored.content, world(branch, undefined)) : [];
      },
    },
  );
}

const NONE: Sending['preconditions'] = {
  ifMatch: undefined,
  ifNoneMatch: undefined,
  lastChange: () => '',
};

/** A job typed into the product's own form says so; a system's key has none (rule 85). */
function sourceOf({ caller, query }: Call<unknown, { via?: 'form' }>): Sending['source'] {
  if (caller?.kind === 'key') return 'key';
  return query.via ?? 'person';
}

function sendingOf(kit: Kit, call: Call, jobRef: string): Sending {
  const { caller } = call;
  return {
    actor: actorOf(caller, call.address),
    source: caller?.kind === 'key' ? 'key' : 'person',
    receivedAt: realClock.now().toISOString(),
    money: moneyFor(caller),
    preconditions: {
      ifMatch: call.ifMatch,
      ifNoneMatch: call.ifNoneMatch,
      lastChange: () => new BranchWriter(kit.store, namedBranch(call)).lastChange(jobRef),
    },
  };
}
