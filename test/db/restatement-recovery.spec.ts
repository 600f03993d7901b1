import { recomputeAll } from '#db/recompute';
import { SmallStore } from '../support/small-store';

const JOBS = 450;
const CHANGE = { kind: 'hourlyCost', code: 'AAA', from: '2020-01-01', value: 7200 } as const;

/** A store whose process stopped after so many commits of a restatement: what lay in memory is gone, the file stays. */
async function stoppedAfter(commits: number): Promise<SmallStore> {
  const small = await SmallStore.make();
  const { queue } = small.store;
  await queue.write(() => {
    for (let n = 0; n < JOBS; n += 1) small.write('AAA', `j-${n}`, {});
  });
  const write = queue.write.bind(queue);
  let done = 0;
  await new Promise<void>((stopped) => {
    queue.write = (work) => {
      done += 1;
      if (done <= commits) return write(work);
      stopped();
      return new Promise(() => undefined);
    };
    void small.change(CHANGE).then(() => stopped());
  });
  queue.write = write;
  await small.putJob('AAA', 'while-restating');
  small.close('keep');
  return SmallStore.reopen(small.folder);
}

const labour = (small: SmallStore): unknown =>
  small.store.writing.driver
    .prepare('select labour_cents, count(*) as jobs from job_facts group by labour_cents')
    .all();
const restating = (small: SmallStore): unknown =>
  small.store.writing.driver.prepare('select restating from network').pluck().get();

describe('Opening after a stop in the middle of a restatement', () => {
  // Mark, three slices, the switch, three sweeps, the end: nine commits.
  it.each([1, 2, 3, 4])(
    'given a stop before the switch (after commit %d), has the old costs whole',
    async (commits) => {
      const small = await stoppedAfter(commits);
      expect(labour(small)).toEqual([{ labour_cents: 12_000, jobs: JOBS + 1 }]);
      expect(restating(small)).toBe(0);
      expect(recomputeAll(small.store)).toEqual([]);
      expect(await small.change(CHANGE)).toBe(JOBS + 1);
      expect(recomputeAll(small.store)).toEqual([]);
      small.close();
    },
  );

  it.each([5, 6, 8, 9])(
    'given a stop after the switch (after commit %d), has the new costs whole',
    async (commits) => {
      const small = await stoppedAfter(commits);
      expect(labour(small)).toEqual([{ labour_cents: 24_000, jobs: JOBS + 1 }]);
      expect(restating(small)).toBe(0);
      expect(recomputeAll(small.store)).toEqual([]);
      small.close();
    },
  );
});
