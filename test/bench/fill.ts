import { BranchWriter } from '#db/branch-writer';
import { Store } from '#db/store';
import { acceptJob } from '#db/accept-job';
import { setUpBench } from './bench-network';
import { jobMaker } from './synthetic-jobs';

const BRANCHES = 120;
const COMMIT = 2_000;

/**
 * Fills a data folder with so many jobs over two years and 120 branches, by the same acceptance as a pushed job; one that has
 * some already, from the same seed, is filled up.
 */
export async function fill(
  folder: string,
  jobs: number,
  today: string,
  already = 0,
): Promise<void> {
  const store = await Store.open(folder);
  if (already === 0) await setUpBench(store, BRANCHES);
  const make = jobMaker(5, today, 728);
  const writers = store.state.branches.map((branch) => new BranchWriter(store, branch));
  for (let index = 0; index < already; index += 1) make(index);
  for (let start = already; start < jobs; start += COMMIT) {
    await store.queue.write(() => {
      for (let index = start; index < Math.min(jobs, start + COMMIT); index += 1) {
        const writer = writers[index % BRANCHES];
        const { jobRef, content } = make(index);
        if (writer) acceptJob(writer, jobRef, content, SENDING);
      }
    });
  }
  store.tidy();
  store.close();
}

const SENDING = {
  actor: { label: 'bench', personId: null, pushKeyId: null, address: 'local' },
  source: 'key',
  receivedAt: '2026-01-01T00:00:00.000Z',
  money: 'seen',
  preconditions: { ifMatch: undefined, ifNoneMatch: undefined, lastChange: () => '' },
} as const;
