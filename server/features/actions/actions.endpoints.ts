import { ActionWriter, type ActionDeed } from '#db/action-writer';
import { countActions, findAction, listActionRows, type ActionRow } from '#db/queries/actions';
import type { ScopedBranch } from '#db/scope';
import * as contract from '#shared/contracts/actions';
import { localDate } from '#shared/domain/calendar';
import { notFound } from '#shared/domain/refusal';
import { ACTION_STATES } from '#shared/domain/vocabulary';
import { actorOf } from '../../auth/caller';
import { realClock, todayIn } from '../../clock';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { actionPlace } from './action-place';
import { agree, answer, change } from './change-action';
import { tellAction } from './tell-action';

/** What leads agree with branches, and what branches answer. */
export function mountActions(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const found = ({ scope, branch, params }: Named): ActionRow | undefined =>
    branch &&
    params &&
    findAction(store.scoped(scope.narrow({ branch: [branch.code] })), params.id);
  const exists = { exists: (named: Named) => found(named) !== undefined };
  const todayOf = ({ timeZone }: ScopedBranch): string => localDate(kit.clock.now(), timeZone);

  mount(mounting, contract.listActions, (call) => {
    const { limit, cursor, state, ...query } = call.query;
    const scope = call.scope.narrow(query);
    const db = store.scoped(scope);
    const filters = { states: state ?? ACTION_STATES };
    const today = todayIn(scope, kit.clock);
    const after = placeOf(cursor, actionPlace);
    const rows = listActionRows(db, filters, after, limit + 1);
    const shown = rows.slice(0, limit);
    const last = shown.at(-1);
    return {
      body: {
        items: shown.map(({ ended: _, key: __, ...row }) => tellAction(row, today)),
        nextCursor:
          rows.length > limit && last
            ? cursorOf({ ended: last.ended, key: last.key, id: last.id })
            : null,
        counts: countActions(db, filters, today),
      },
    };
  });

  mount(mounting, contract.getAction, async (call) => {
    const row = found(call);
    if (!row) throw notFound();
    const branch = namedBranch(call);
    const today = todayOf(branch);
    const effect = await kit.reads.answer(
      'actionEffect',
      call.scope.narrow({ branch: [branch.code] }),
      {
        measure: row.measure,
        agreedOn: row.agreedOn,
        today,
      },
    );
    return { body: { ...tellAction(row, today), effect } };
  });

  mount(mounting, contract.agreeAction, async (call) => {
    const branch = namedBranch(call);
    const [writer, deed, today] = [new ActionWriter(store, branch), deedIn(call), todayOf(branch)];
    const row = await store.queue.write(() => agree(writer, call.body, today, deed));
    return { body: tellAction(row, today) };
  });

  mount(
    mounting,
    contract.changeAction,
    async (call) => {
      const branch = namedBranch(call);
      const { id } = call.params;
      const [writer, deed, today] = [
        new ActionWriter(store, branch),
        deedIn(call),
        todayOf(branch),
      ];
      const row = await store.queue.write(() => change(writer, id, call.body, today, deed));
      return { body: tellAction(row, today) };
    },
    exists,
  );

  mount(
    mounting,
    contract.answerAction,
    async (call) => {
      const branch = namedBranch(call);
      const { id } = call.params;
      const [writer, deed] = [new ActionWriter(store, branch), deedIn(call)];
      const row = await store.queue.write(() => answer(writer, id, call.body.text, deed));
      return { body: tellAction(row, todayOf(branch)) };
    },
    exists,
  );
}

type Named = Pick<Call, 'scope' | 'branch'> & { params: { id: number } | undefined };

function deedIn({ caller, address }: Pick<Call, 'caller' | 'address'>): ActionDeed {
  if (caller?.kind !== 'person') throw notFound();
  return {
    actor: { ...actorOf(caller, address), personId: caller.id },
    at: realClock.now().toISOString(),
  };
}
