import {
  countSignals,
  findSignal,
  lastLookedOn,
  listSignalCars,
  listSignalRows,
} from '#db/queries/signals';
import { SignalWriter } from '#db/signal-writer';
import { acknowledgeSignal, getSignal, listSignals, type Signal } from '#shared/contracts/signals';
import { notFound } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { acknowledge } from './acknowledge-signal';
import { signalPlace } from './signal-place';

/** What the nightly look found, and what people say of it. */
export function mountSignals(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const found = ({ scope, branch, params }: Named): Signal | undefined =>
    branch && params && findSignal(store.scoped(scope), scope, branch.code, params.id);

  mount(mounting, listSignals, ({ scope, query }) => {
    const db = store.scoped(scope.narrow(query));
    const filters = {
      reach: scope,
      states: query.state ?? (['open', 'acknowledged'] as const),
      kinds: query.kind,
    };
    return {
      body: db.snapshot(() => {
        const after = placeOf(query.cursor, signalPlace);
        const { items, next } = listSignalRows(db, filters, after, query.limit);
        return {
          items,
          nextCursor: next && cursorOf(next),
          counts: countSignals(db, filters),
          lookedOn: lastLookedOn(db),
        };
      }),
    };
  });

  mount(mounting, getSignal, (call) => {
    const signal = found(call);
    if (!signal) throw notFound();
    const listed = listSignalCars(store.scoped(call.scope), signal.id);
    return { body: { ...signal, listed } };
  });

  mount(
    mounting,
    acknowledgeSignal,
    async (call) => {
      const { caller, scope, params, body } = call;
      if (caller?.kind !== 'person') throw notFound();
      const writer = new SignalWriter(store, namedBranch(call));
      const acknowledging = {
        actor: { ...actorOf(caller, call.address), personId: caller.id },
        at: realClock.now().toISOString(),
        reach: scope,
      };
      const signal = await store.queue.write(() =>
        acknowledge(writer, params.id, body.note, acknowledging),
      );
      kit.live.tell({ kind: 'signals', branchId: writer.branch.id, count: 1, by: caller.id });
      return { body: signal };
    },
    { exists: (named) => found(named) !== undefined },
  );
}

type Named = Pick<Call, 'scope' | 'branch'> & { params: { id: number } | undefined };
