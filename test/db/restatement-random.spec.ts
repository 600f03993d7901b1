import fc from 'fast-check';
import type { CostChange } from '#shared/domain/cost-book';
import { FROM_THE_START } from '#shared/domain/cost-book';
import { addDays } from '#shared/domain/calendar';
import type { SentJob } from '#shared/domain/normalise-job';
import { BODY_TYPES, CONSUMABLE_KINDS, STAGES } from '#shared/domain/vocabulary';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { recomputeAll } from '#db/recompute';
import { readJobSheet } from '#server/features/jobs/read-job-sheet';
import { recountJob } from '../support/recount-job';
import { SmallStore } from '../support/small-store';

const day = fc.integer({ min: 0, max: 40 }).map((days) => addDays('2025-12-20', days));
const cents = fc.oneof(fc.nat(10_000), fc.nat(10 ** 9));
const bodyType = fc.constantFrom(...BODY_TYPES.slice(0, 2));
const product = fc.constantFrom('CW1', 'UW1');
const ml = fc.oneof(fc.nat(9000), fc.nat(10 ** 6));
const branch = fc.constantFrom('AAA', 'BBB');
const kind = fc.constantFrom(...CONSUMABLE_KINDS.slice(0, 2));
const stages = fc.record(
  Object.fromEntries(STAGES.map((stage) => [stage, fc.nat(999)])) as Record<
    (typeof STAGES)[number],
    fc.Arbitrary<number>
  >,
  { requiredKeys: [] },
);

const job: fc.Arbitrary<Partial<SentJob>> = fc.record({
  vehicle: bodyType.map((body) => ({
    make: 'Vela',
    model: 'Ono',
    bodyType: body,
    firstRegistered: '2010-01',
  })),
  package: fc.constantFrom('full', 'cavity'),
  completedOn: day,
  estimate: fc.option(fc.record({ priceCents: cents, stages }), { nil: undefined }),
  actual: fc.record({ stages }),
  products: fc.array(fc.record({ product, ml }), { maxLength: 3 }),
  consumables: fc.array(
    fc.record({
      kind,
      quantity: fc.nat(20),
      unitCostCents: fc.option(fc.nat(500), { nil: undefined }),
    }),
    { maxLength: 2 },
  ),
  boughtInCents: fc.nat(5000),
  invoice: fc.option(fc.record({ totalCents: cents }), { nil: undefined }),
});

const lines = fc.uniqueArray(fc.record({ product, ml }), {
  maxLength: 2,
  selector: (line) => line.product,
});
const change: fc.Arbitrary<CostChange> = fc.oneof(
  fc.record({ kind: fc.constant('hourlyCost' as const), code: branch, from: day, value: cents }),
  fc.record({ kind: fc.constant('product' as const), code: product, from: day, value: cents }),
  fc.record({ kind: fc.constant('consumable' as const), code: kind, from: day, value: cents }),
  fc.record({
    kind: fc.constant('fee' as const),
    from: fc.oneof(day, fc.constant(FROM_THE_START)),
    value: fc.nat(1_000_000),
  }),
  fc.record({
    kind: fc.constant('norm' as const),
    package: fc.constantFrom('full', 'cavity'),
    bodyType,
    lines,
  }),
);

const step = fc.oneof(
  { weight: 3, arbitrary: fc.record({ put: job, branch, ref: fc.constantFrom('a', 'b', 'c') }) },
  { weight: 3, arbitrary: fc.record({ change }) },
  { weight: 1, arbitrary: fc.record({ drop: fc.constantFrom('a', 'b', 'c'), branch }) },
);

/** Every visible job's sheet against a count of our own; returns how many had a bridge. */
function checkSheets(small: SmallStore): number {
  const { store } = small;
  let bridges = 0;
  const db = store.scoped(small.scope('AAA', 'BBB'));
  const rows = db.all<{ branch: string; ref: string; costed: number; expected: number }>(
    db
      .table('job_facts', 'f')
      .join('branches as b', 'b.id', 'f.branch_id')
      .select({ branch: 'b.code', ref: 'f.job_ref' }, 'f.costed', 'f.expected'),
  );
  for (const { branch: code, ref, costed, expected } of rows) {
    const { revisions: _, money, ...job } = readJobSheet(db, code, ref, store.state.costs, 'seen');
    const { margin, expectedMargin } = recountJob(store, code, job as unknown as RecordedJob);
    expect([costed, expected]).toEqual([
      Number(margin !== undefined),
      Number(margin !== undefined && expectedMargin !== undefined),
    ]);
    if (!money) continue;
    expect(money.marginCents).toBe(job.invoice ? Number(margin) : null);
    if (!money.bridge) continue;
    const { expectedMarginCents, marginCents, ...steps } = money.bridge;
    expect(BigInt(expectedMarginCents)).toBe(expectedMargin);
    const walked = Object.values(steps).reduce((sum, cents) => sum + cents, expectedMarginCents);
    bridges += 1;
    expect([BigInt(walked), BigInt(marginCents)]).toEqual([margin, margin]);
  }
  return bridges;
}

describe('Any jobs and any changes of cost in any order', () => {
  it('given them one after another or at once, keep the rows that a full recomputation gives, bridged to the cent', async () => {
    const small = await SmallStore.make();
    let bridges = 0;
    await fc.assert(
      fc.asyncProperty(
        fc.array(step, { minLength: 4, maxLength: 14 }),
        fc.boolean(),
        async (steps, atOnce) => {
          const works: Promise<unknown>[] = [];
          for (const one of steps) {
            const work =
              'put' in one
                ? small.putJob(one.branch, one.ref, one.put as SentJob)
                : 'change' in one
                  ? small.change(one.change)
                  : small.voidJob(one.branch, one.drop);
            works.push(work);
            if (!atOnce) await work;
          }
          await Promise.all(works);
          expect(recomputeAll(small.store)).toEqual([]);
          bridges += checkSheets(small);
        },
      ),
      { numRuns: 40 },
    );
    const { generation } = small.store.state;
    expect(generation).toBeGreaterThan(100);
    expect(bridges).toBeGreaterThan(20);
    expect(small.count('job_facts')).toBeLessThanOrEqual(6);
    small.close();
  }, 60_000);
});
