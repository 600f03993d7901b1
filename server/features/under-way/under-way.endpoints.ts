import { findUnderWay, listUnderWay } from '#db/queries/under-way';
import type { Scope, ScopedBranch } from '#db/scope';
import { UnderWayWriter, type UnderWayDeed } from '#db/under-way-writer';
import {
  dropUnderWay,
  getUnderWay,
  keepUnderWay as keepContract,
  listUnderWay as listContract,
} from '#shared/contracts/under-way';
import { checkPreconditions, tagOf, type Preconditions } from '#shared/domain/preconditions';
import { notFound } from '#shared/domain/refusal';
import { moneyFor } from '../../auth/caller';
import { deedOf } from '../../http/deed';
import { dropPhotoBytes } from '../../storage/photo-bytes';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { keepUnderWay } from './keep-under-way';
import { tellUnderWay } from './tell-under-way';

/** Jobs under way, kept for the colleagues of the branch until they are sent. */
export function mountUnderWay(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const exists = ({ branch, scope, params }: Named): boolean =>
    branch !== undefined &&
    findUnderWay(store.scoped(scope), branch.id, params.jobRef) !== undefined;

  mount(mounting, listContract, (call) => {
    const branch = namedBranch(call);
    const rows = listUnderWay(store.scoped(call.scope), branch.id);
    const money = moneyFor(call.caller);
    return { body: { items: rows.map((row) => tellUnderWay(branch.code, row, money)) } };
  });

  mount(mounting, getUnderWay, (call) => {
    const branch = namedBranch(call);
    const row = findUnderWay(store.scoped(call.scope), branch.id, call.params.jobRef);
    if (!row) throw notFound();
    return {
      body: tellUnderWay(branch.code, row, moneyFor(call.caller)),
      headers: { ETag: tagOf(row.revision) },
    };
  });

  mount(mounting, keepContract, async (call) => {
    const branch = namedBranch(call);
    const writer = new UnderWayWriter(store, branch);
    const { jobRef } = call.params;
    const money = moneyFor(call.caller);
    const keeping = { money, preconditions: preconditionsOf(writer, call) };
    const { status, row } = await store.queue.write(() =>
      keepUnderWay(writer, jobRef, call.body, keeping, deedOn(call)),
    );
    return {
      status: status === 'created' ? 201 : 200,
      body: tellUnderWay(branch.code, row, money),
      headers: { ETag: tagOf(row.revision) },
    };
  });

  mount(
    mounting,
    dropUnderWay,
    async (call) => {
      const writer = new UnderWayWriter(store, namedBranch(call));
      const { jobRef } = call.params;
      const photos = await store.queue.write(() => {
        const row = writer.find(jobRef);
        if (!row) throw notFound();
        const present = { revision: row.revision, voided: false };
        checkPreconditions(preconditionsOf(writer, call), present);
        return writer.drop(jobRef, row, deedOn(call));
      });
      await Promise.all(photos.map((storageKey) => dropPhotoBytes(kit.photos, storageKey)));
      return {};
    },
    { exists },
  );
}

interface Named {
  branch: ScopedBranch | undefined;
  scope: Scope;
  params: { jobRef: string };
}
type NamingCall = Call<{ jobRef: string }>;

function subjectOf(call: NamingCall): string {
  return `/branches/${namedBranch(call).code}/under-way/${call.params.jobRef}`;
}

function deedOn(call: NamingCall): UnderWayDeed {
  const { actor, ...deed } = deedOf(call, subjectOf(call));
  const { personId } = actor;
  if (personId === null) throw new Error('only people keep jobs under way');
  return { ...deed, actor: { ...actor, personId } };
}

function preconditionsOf(writer: UnderWayWriter, call: NamingCall): Preconditions {
  return {
    ifMatch: call.ifMatch,
    ifNoneMatch: call.ifNoneMatch,
    lastChange: () => writer.lastChange(call.params.jobRef, subjectOf(call)),
  };
}
