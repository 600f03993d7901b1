import type { listSignals, Signal } from '#shared/contracts/signals';
import type { OutOf } from '#shared/contracts/endpoint';

type SignalList = OutOf<typeof listSignals>;

/** Five cars of Havnsund that wait for their bill, noticed in the last night, unless said. */
export function signalOf(id: number, more: Partial<Signal> = {}): Signal {
  return {
    id,
    branch: 'HAV',
    kind: 'unbilled',
    measure: null,
    state: 'open',
    since: '2026-01-10',
    openedOn: '2026-02-02',
    lastSeenOn: '2026-02-02',
    overOn: null,
    strength: 23,
    facts: {
      oldestOn: '2026-01-10',
      oldestDays: 23,
      costCents: 210_000,
      withoutCost: 0,
      currency: 'EUR',
    },
    cars: 5,
    acknowledged: null,
    ...more,
  };
}

/** Two dangerous come-backs past their day, unless said. */
export function dangerSignal(id: number, more: Partial<Signal> = {}): Signal {
  return signalOf(id, {
    kind: 'come_backs_due',
    since: '2026-01-05',
    strength: 28,
    facts: { findings: 3, oldestDueOn: '2026-01-05', notTold: 1 },
    cars: 2,
    ...more,
  });
}

/** A list of signals as the API answers it, counted by state unless said. */
export function signalList(items: readonly Signal[], more: Partial<SignalList> = {}): SignalList {
  const count = (state: Signal['state']): number =>
    items.filter((one) => one.state === state).length;
  return {
    items: [...items],
    nextCursor: null,
    counts: { open: count('open'), acknowledged: count('acknowledged'), over: count('over') },
    lookedOn: '2026-02-02',
    ...more,
  };
}
