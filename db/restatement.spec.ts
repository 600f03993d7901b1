import { CostBook, type CostChange } from '#shared/domain/cost-book';
import { SmallStore } from '../test/support/small-store';
import { recomputeAll } from './recompute';
import { NO_END } from './tables';

let small: SmallStore;
beforeEach(async () => (small = await SmallStore.make()));
afterEach(() => small.close());

interface Seen {
  labour_cents: number;
  product_cents: number;
  consumables_cents: number;
  fee_cents: number;
  exp_product_cents: number;
  costed: number;
}
const factsOf = (jobRef: string, branch = 'AAA'): Seen => {
  const db = small.store.scoped(small.scope(branch));
  const rows = db.all<Seen>(db.table('job_facts').where({ job_ref: jobRef }));
  if (rows.length !== 1) throw new Error(`${rows.length} rows of ${jobRef} are visible`);
  return rows[0]!;
};
const generation = (): number => small.store.state.generation;

describe('Restatement.apply', () => {
  it.each<[string, CostChange, Partial<Seen>, Partial<Seen>]>([
    [
      'an hourly cost',
      { kind: 'hourlyCost', code: 'AAA', from: '2026-01-28', value: 6000 },
      { labour_cents: 12_000 },
      { labour_cents: 20_000 },
    ],
    [
      'a product cost',
      { kind: 'product', code: 'CW1', from: '2026-01-01', value: 1001 },
      { product_cents: 4680, exp_product_cents: 4800 },
      { product_cents: 3904, exp_product_cents: 4004 },
    ],
    [
      'a consumable cost',
      { kind: 'consumable', code: 'trim_clip', from: '2026-01-01', value: 7 },
      { costed: 0, consumables_cents: 0 },
      { costed: 1, consumables_cents: 35 },
    ],
    [
      'a fee',
      { kind: 'fee', from: '2026-01-01', value: 100_000 },
      { fee_cents: 3000 },
      { fee_cents: 6000 },
    ],
    [
      'a norm',
      { kind: 'norm', package: 'full', bodyType: 'van', lines: [{ product: 'CW1', ml: 1000 }] },
      { exp_product_cents: 4800 },
      { exp_product_cents: 1200 },
    ],
  ])('given %s, gives the jobs it touches other figures', async (_, change, before, after) => {
    const consumables = change.kind === 'consumable' ? [{ kind: 'trim_clip', quantity: 5 }] : [];
    await small.putJob('AAA', 'a', { consumables } as never);
    await small.putJob('BBB', 'old', { completedOn: '2025-12-31', package: 'cavity' } as never);
    const other = factsOf('old', 'BBB');
    expect(factsOf('a')).toMatchObject(before);
    expect(await small.change(change)).toBe(1);
    expect(factsOf('a')).toMatchObject(after);
    expect(factsOf('old', 'BBB')).toEqual(other);
    expect(recomputeAll(small.store)).toEqual([]);
  });

  it('given a change that a later entry ends, reaches no job after it', async () => {
    await small.change({ kind: 'hourlyCost', code: 'AAA', from: '2026-01-01', value: 3600 });
    await small.putJob('AAA', 'a');
    const change = { kind: 'hourlyCost', code: 'AAA', from: '2025-06-01', value: 9 } as const;
    expect(await small.change(change)).toBe(0);
    expect(factsOf('a').labour_cents).toBe(12_000);
  });

  it('given a change that alters nothing, restates nothing', async () => {
    await small.putJob('AAA', 'a');
    expect(await small.change({ kind: 'product', code: 'UW1', from: '2020-01-01', value: 5 })).toBe(
      0,
    );
  });

  it('given a norm whose products have no cost, names them as a new start would', async () => {
    await small.putJob('AAA', 'a');
    const lines = [
      { product: 'UW1', ml: 5 },
      { product: 'CW1', ml: 5 },
    ];
    await small.change({ kind: 'norm', package: 'full', bodyType: 'van', lines });
    await small.change({ kind: 'product', code: 'CW1', from: '2026-02-01', value: 5 });
    expect(recomputeAll(small.store)).toEqual([]);
  });

  it('given jobs of several slices, restates every one and leaves one row each', async () => {
    await small.store.queue.write(() => {
      for (let n = 0; n < 450; n += 1) small.write('AAA', `j-${n}`, {});
    });
    const change = { kind: 'fee', from: '2026-01-01', value: 1 } as const;
    expect(await small.change(change)).toBe(450);
    expect(small.count('job_facts')).toBe(450);
    expect(small.count('job_products')).toBe(450);
    expect(recomputeAll(small.store)).toEqual([]);
  });

  it('given a record that throws, changes nothing and takes the next change', async () => {
    await small.putJob('AAA', 'a');
    const change = { kind: 'fee', from: '2026-01-01', value: 1 } as const;
    const bad = small.store.restatement.apply(change, () => {
      throw new Error('not allowed');
    });
    await expect(bad).rejects.toThrow('not allowed');
    expect(factsOf('a').fee_cents).toBe(3000);
    expect(small.store.state.nextCosts).toBeUndefined();
    expect(recomputeAll(small.store)).toEqual([]);
    expect(await small.change(change)).toBe(1);
    expect(factsOf('a').fee_cents).toBe(0);
  });

  it('given changes sent at once, applies them one after another', async () => {
    await small.putJob('AAA', 'a');
    const before = generation();
    await Promise.all(
      [1, 2, 3].map((value) =>
        small.change({ kind: 'fee', from: '2026-01-01', value: value * 10_000 }),
      ),
    );
    expect(generation()).toBe(before + 3);
    expect(factsOf('a').fee_cents).toBe(1800);
    expect(recomputeAll(small.store)).toEqual([]);
  });

  it('given a first step that cannot be written, leaves no next book behind', async () => {
    const { queue, state } = small.store;
    const write = queue.write.bind(queue);
    queue.write = (work) => {
      queue.write = write;
      return write(() => {
        work();
        throw new Error('disk full');
      });
    };
    const lost = small.change({ kind: 'fee', from: '2026-01-01', value: 1 });
    await expect(lost).rejects.toThrow('disk full');
    expect(state.nextCosts).toBeUndefined();
  });
});

describe('Restatement.apply after one that could be neither finished nor taken back', () => {
  it('given what it left behind, clears it away before it begins', async () => {
    await small.putJob('AAA', 'a');
    const { queue } = small.store;
    const write = queue.write.bind(queue);
    let pieces = 0;
    queue.write = (work) =>
      write(() => {
        // The mark and the first slice are written; then the disk is full, for the taking back too.
        if ((pieces += 1) > 2) throw new Error('disk full');
        return work();
      });
    const lost = small.change({ kind: 'fee', from: '2026-01-01', value: 777_000 });
    await expect(lost).rejects.toThrow('disk full');
    queue.write = write;
    expect(small.count('job_facts')).toBe(2);
    await small.change({ kind: 'hourlyCost', code: 'BBB', from: '2026-01-01', value: 1 });
    expect(factsOf('a').fee_cents).toBe(3000);
    expect(small.count('job_facts')).toBe(1);
    expect(recomputeAll(small.store)).toEqual([]);
  });
});

describe('recomputeAll', () => {
  it('given a derived row that somebody changed, names its job', async () => {
    await small.putJob('AAA', 'a');
    await small.putJob('AAA', 'b');
    small.store.writing.driver.exec("update job_facts set labour_cents = 1 where job_ref = 'b'");
    expect(recomputeAll(small.store)).toHaveLength(1);
    small.store.writing.driver.exec('delete from job_products');
    expect(recomputeAll(small.store)).toHaveLength(2);
  });

  it('given a second row that overlaps the first, names its job', async () => {
    await small.putJob('AAA', 'a');
    const { driver } = small.store.writing;
    const columns = (driver.pragma('table_info(job_facts)') as { name: string }[])
      .map(({ name }) => name)
      .filter((name) => name !== 'id');
    const others = columns.map((name) => (name === 'gen_from' ? '-1' : name));
    driver.exec(`insert into job_facts (${columns.join()}) select ${others.join()} from job_facts`);
    expect(recomputeAll(small.store)).toHaveLength(1);
  });
});

describe('NetworkState', () => {
  it('given any changes, holds in memory the book that a new start would read', async () => {
    await small.change({ kind: 'consumable', code: 'other', from: '2026-01-01', value: 3 });
    await small.change({ kind: 'norm', package: 'full', bodyType: 'van', lines: [] });
    const { costs } = small.store.state;
    small.store.state.reload();
    expect(small.store.state.costs).toEqual(costs);
    expect(costs).toBeInstanceOf(CostBook);
    expect(NO_END).toBeGreaterThan(generation());
  });
});
