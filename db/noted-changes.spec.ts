import { SmallStore } from '../test/support/small-store';
import type { BranchChange } from './noted-changes';

let small: SmallStore;
let told: BranchChange[][];
beforeEach(async () => {
  small = await SmallStore.make();
  told = [];
  small.store.changes.listen((changes) => told.push([...changes]));
});
afterEach(() => small.close());

const jobs = (branch: string, count: number, added: number): BranchChange => ({
  kind: 'jobs',
  branchId: small.branch(branch).id,
  count,
  added,
});

describe('NotedChanges', () => {
  it('given a job written, corrected and voided, tells of each after its commit', async () => {
    await small.putJob('AAA', '1');
    await small.store.queue.write(() => small.write('AAA', '1', { notes: 'other' }));
    await small.voidJob('AAA', '1');
    expect(told).toEqual([[jobs('AAA', 1, 1)], [jobs('AAA', 1, 0)], [jobs('AAA', 1, 0)]]);
  });

  it('given many jobs of one commit, tells one change a branch', async () => {
    const sent = [1, 2, 3, 4].map((n) => small.putJob(n === 3 ? 'BBB' : 'AAA', String(n)));
    await Promise.all(sent);
    expect(told).toEqual([[jobs('AAA', 3, 3), jobs('BBB', 1, 1)]]);
  });

  it('given pieces of several people in one commit, tells each one’s apart', async () => {
    const put = (ref: string, by?: number | null) =>
      small.store.queue.write(() => small.write('AAA', ref, {}), by);
    await Promise.all([put('1', 7), put('2', 8), put('3', 7), put('4'), put('5', null)]);
    expect(told).toEqual([
      [{ ...jobs('AAA', 2, 2), by: 7 }, { ...jobs('AAA', 1, 1), by: 8 }, jobs('AAA', 2, 2)],
    ]);
  });

  it('given a piece that is rolled back beside one that is kept, tells only of the kept one', async () => {
    const settled = await Promise.allSettled([
      small.store.queue.write(() => {
        small.write('AAA', '1', {});
        throw new Error('no');
      }),
      small.putJob('BBB', '2'),
    ]);
    expect(settled.map(({ status }) => status)).toEqual(['rejected', 'fulfilled']);
    expect(told).toEqual([[jobs('BBB', 1, 1)]]);
  });

  it('given a commit that fails, tells nothing, not even with the next', async () => {
    const failing = small.store.queue.write(() => {
      small.write('AAA', '1', {});
      // What keeps a commit from being made, as a full disk would.
      small.store.writing.driver.pragma('defer_foreign_keys = ON');
      small.store.writing.driver.exec('delete from branches');
    });
    await expect(failing).rejects.toMatchObject({
      code: expect.stringMatching(/^SQLITE_CONSTRAINT/),
    });
    expect(small.count('jobs')).toBe(0);
    await small.putJob('BBB', '2');
    expect(told).toEqual([[jobs('BBB', 1, 1)]]);
  });

  it('given a write of the row itself, past every writer, tells of it too', async () => {
    await small.putJob('AAA', '1');
    await small.store.queue.write(() =>
      small.store.writing.driver.exec(`update jobs set voided_at = '2026-01-01T00:00:00Z'`),
    );
    expect(told.slice(1)).toEqual([[jobs('AAA', 1, 0)]]);
  });

  it('given other writes, tells nothing', async () => {
    await small.putJob('AAA', '1');
    told.length = 0;
    await small.change({ kind: 'hourlyCost', code: 'AAA', from: '2025-01-01', value: 4000 });
    expect(told).toEqual([]);
  });

  it('given what a commit is told of, has it on disk by then', async () => {
    let seen = -1;
    small.store.changes.listen(() => {
      const db = small.store.scoped(small.scope('AAA'));
      seen = db.all(db.table('job_facts')).length;
    });
    await small.putJob('AAA', '1');
    expect(seen).toBe(1);
  });
});
