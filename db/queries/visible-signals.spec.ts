import { headOfficeOf } from '../../test/support/rot-store';
import { SmallStore } from '../../test/support/small-store';
import { sql } from '../database';
import type { Scope } from '../scope';
import { readDigestSignals, readWaiting } from './digests';
import { countSignals, findSignal, listSignalRows } from './signals';

let small: SmallStore;
beforeEach(async () => (small = await SmallStore.make()));
afterEach(() => small.close());

/** Keeps a signal of AAA that compares it with AAA, BBB and some branches of others. */
async function keepCompared(strangers: number): Promise<number> {
  const own = small.scope('AAA', 'BBB').branches.map(({ id }) => id);
  const others = Array.from({ length: strangers }, (_, place) => 1000 + place);
  return small.store.queue.write(
    () =>
      small.store.unscoped.run(
        sql('signals').insert({
          branch_id: own[0],
          kind: 'left_funnel',
          key: 'rot',
          measure: 'rot',
          since: '2026-02-02',
          opened_on: '2026-02-02',
          last_seen_on: '2026-02-02',
          strength: 1.2,
          facts: '{}',
          cars: 9,
          job_refs: '[]',
          behind: JSON.stringify([...own, ...others]),
        }),
      ).id,
  );
}

/** How many times each reader tells of it. */
function told(id: number, reach: Scope, scope = reach): number[] {
  const db = small.store.scoped(scope);
  const filters = { reach, states: ['open'] as const, kinds: undefined };
  return [
    listSignalRows(db, filters, null, 10).items.length,
    countSignals(db, filters).open,
    findSignal(db, reach, 'AAA', id) ? 1 : 0,
    readWaiting(db, '2026-02-02').signals,
    readDigestSignals(db, '2026-01-01').length,
  ];
}

describe('A signal that compares with the network', () => {
  it.each([
    [5, 'every reader', 1],
    [4, 'none (rule 81)', 0],
  ])(
    'given %i strangers behind it, is told by %s, also of a part of the reach',
    async (n, _who, times) => {
      const id = await keepCompared(n);
      const reach = small.scope('AAA', 'BBB');
      expect(told(id, reach)).toEqual(Array(5).fill(times));
      expect(told(id, reach, reach.narrow({ branch: ['AAA'] }))).toEqual(Array(5).fill(times));
    },
  );

  it('given head office, is told whoever stands behind it', async () => {
    const id = await keepCompared(0);
    expect(told(id, headOfficeOf(small))).toEqual(Array(5).fill(1));
  });
});
