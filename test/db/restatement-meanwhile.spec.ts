import { recomputeAll } from '#db/recompute';
import type { ScopedDb } from '#db/scoped-db';
import { SmallStore } from '../support/small-store';

/** Jobs of the small store's plain kind: labour 12,000 at 36.00 an hour, product 4,680 at 12.00 a litre. */
const JOBS = 500;
let small: SmallStore;

beforeEach(async () => {
  small = await SmallStore.make();
  await small.store.queue.write(() => {
    for (let n = 0; n < JOBS; n += 1) small.write('AAA', `j-${n}`, {});
  });
});
afterEach(() => small.close());

interface Sums {
  jobs: number;
  labour: number;
  products: number;
}
const sums = (db: ScopedDb): Sums =>
  db.snapshot(() => {
    const facts = db.table('job_facts').count({ jobs: '*' }).sum({ labour: 'labour_cents' });
    const [seen] = db.all<Omit<Sums, 'products'>>(facts);
    const [lines] = db.all<{ n: number }>(db.table('job_products').count({ n: '*' }));
    return { jobs: seen!.jobs, labour: seen!.labour, products: lines!.n };
  });
const turn = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));

/** What a reader sees in every turn of the event loop until something settles. */
async function watch(until: Promise<unknown>, look: () => Sums): Promise<Sums[]> {
  const seen: Sums[] = [look()];
  let over = false;
  void until.then(() => (over = true));
  while (!over) {
    await turn();
    seen.push(look());
  }
  return seen;
}

describe('A restatement', () => {
  it('given readers meanwhile, shows them all jobs at the old cost or all at the new, never a mix', async () => {
    const db = small.store.scoped(small.scope('AAA'));
    const change = { kind: 'hourlyCost', code: 'AAA', from: '2020-01-01', value: 7200 } as const;
    const done = small.change(change);
    const seen = await watch(done, () => sums(db));
    expect(await done).toBe(JOBS);
    const old = { jobs: JOBS, labour: JOBS * 12_000, products: JOBS };
    const restated = { ...old, labour: JOBS * 24_000 };
    const switchedAt = seen.findIndex(({ labour }) => labour !== old.labour);
    // The old figures were seen while slices were being written, the new ones while old rows were being removed.
    expect(switchedAt).toBeGreaterThan(2);
    expect(seen.slice(0, switchedAt)).toEqual(Array(switchedAt).fill(old));
    const after = seen.slice(switchedAt);
    expect(after.length).toBeGreaterThan(1);
    expect(after).toEqual(Array(after.length).fill(restated));
  });

  it('given jobs sent, corrected and voided meanwhile, ends with rows as from the beginning', async () => {
    const changes = Promise.all([
      small.change({ kind: 'fee', from: '2026-01-01', value: 120_000 }),
      small.change({ kind: 'product', code: 'CW1', from: '2025-01-01', value: 999 }),
      small.change({ kind: 'norm', package: 'full', bodyType: 'van', lines: [] }),
    ]);
    let over = false;
    void changes.then(() => (over = true));
    let n = 0;
    while (!over) {
      n += 1;
      const at = (n * 37) % JOBS;
      await Promise.all([
        small.putJob('AAA', `new-${n}`),
        small.putJob('AAA', `j-${at}`, { products: [{ product: 'CW1', ml: n }] } as never),
        small.putJob('BBB', `b-${n}`, { products: [{ product: 'UW1', ml: n }] } as never),
        small.voidJob('AAA', `j-${(at + 5) % JOBS}`),
        small.voidJob('AAA', `new-${n - 3}`),
      ]);
    }
    await changes;
    expect(n).toBeGreaterThan(5);
    expect(recomputeAll(small.store)).toEqual([]);
    const voided = small.store.writing.driver
      .prepare('select count(*) from jobs where voided_at is not null')
      .pluck()
      .get();
    expect(small.count('job_facts')).toBe(small.count('jobs') - Number(voided));
  });

  it('given jobs sent meanwhile, acknowledges each before the restatement is over', async () => {
    const change = { kind: 'fee', from: '2020-01-01', value: 1 } as const;
    const order: string[] = [];
    await Promise.all([
      small.change(change).then(() => order.push('restated')),
      turn()
        .then(() => small.putJob('CCC', 'c'))
        .then(() => order.push('job')),
    ]);
    expect(order).toEqual(['job', 'restated']);
  });
});
