import fc from 'fast-check';
import { mean, quantileSorted } from 'simple-statistics';
import { addDays } from '#shared/domain/calendar';
import type { SentJob } from '#shared/domain/normalise-job';
import { unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerProducts } from './answer-products';

let small: SmallStore;
beforeAll(async () => {
  small = await SmallStore.make();
  // UW1 costs nothing known until 2022-03-01.
  await small.change({ kind: 'product', code: 'UW1', from: '2022-03-01', value: 999 });
});
afterAll(() => small.close());

const ask = (from: string, to = from, branches = ['AAA', 'BBB']) =>
  answerProducts(small.store.scoped(small.scope(...branches)), {
    period: { from, to },
    filters: {},
  });
const car = (on: string, over: Partial<SentJob>): SentJob => ({ ...unbilledJob(on), ...over });
const VAN = { make: 'Vela', model: 'Ono', bodyType: 'van' as const, firstRegistered: '2010-01' };

describe('answerProducts', () => {
  it('given an empty network, answers with nothing in it', () => {
    const answer = ask('2020-02-01', '2020-03-01', []);
    expect(answer).toMatchObject({ jobs: 0, withoutCost: 0, use: [], branches: [] });
    expect(answer.overall).toEqual({
      ...{
        cars: 0,
        costedCars: 0,
        ratioToNorm: null,
        lower: null,
        upper: null,
        costPerCarCents: null,
      },
    });
    expect(answer.temperature).toEqual([]);
  });

  it('given one car without a line of its normed product, has the row with that car', async () => {
    await small.putJob('AAA', 'one', unbilledJob('2021-01-04'));
    const { use, branches, jobs } = ask('2021-01-04');
    expect(jobs).toBe(1);
    expect(use).toHaveLength(1);
    expect(use[0]).toMatchObject({
      ...{ product: 'CW1', package: 'full', bodyType: 'van', cars: 1, carsListing: 0 },
      ...{ normMl: 4000, under: 1, over: 0, meanMl: null, underShare: null },
    });
    expect(branches).toEqual([
      { branch: 'AAA', cars: 1, ratioToNorm: null, lower: null, upper: null },
    ]);
  });

  it('given a cost not known, counts the job apart and names the product with its first day (rule 11)', async () => {
    const both = [
      { product: 'CW1', ml: 1000 },
      { product: 'UW1', ml: 500 },
    ];
    for (const [at, day] of ['2022-02-26', '2022-02-27', '2022-03-01'].entries()) {
      await small.putJob('AAA', `cost-${at}`, car(day, { products: both }));
    }
    for (let at = 0; at < 5; at += 1) {
      await small.putJob('AAA', `plain-${at}`, car('2022-03-02', { products: [] }));
    }
    const answer = ask('2022-02-25', '2022-03-02');
    expect([answer.jobs, answer.withoutCost]).toEqual([8, 2]);
    expect(answer.missingCosts).toEqual([{ kind: 'product', code: 'UW1', on: '2022-02-26' }]);
    // One car of 1200 + 500 (499.5 rounded), five of nothing: 1700 / 6.
    expect(answer.overall.costPerCarCents).toBe(283);
    const [normed, loose] = answer.use;
    expect(normed).toMatchObject({ product: 'CW1', cars: 8, costPerCarCents: 450 });
    expect(loose).toMatchObject({ product: 'UW1', cars: 3, costPerCarCents: null, under: null });
  });

  it('given a product that only a norm of the job wants a cost of, counts no job as without cost', async () => {
    await small.change({
      ...{ kind: 'norm', package: 'cavity', bodyType: 'suv' },
      lines: [{ product: 'UW1', ml: 100 }],
    });
    const suv = { ...VAN, bodyType: 'suv' as const };
    await small.putJob(
      'AAA',
      'norm-only',
      car('2021-05-03', {
        package: 'cavity',
        vehicle: suv,
        estimate: { priceCents: 1, stages: {} },
      }),
    );
    expect(ask('2021-05-03')).toMatchObject({ jobs: 1, withoutCost: 0, missingCosts: [] });
  });
});

describe('answerProducts, on generated jobs', () => {
  const drawn = fc.record({
    branch: fc.constantFrom('AAA', 'BBB', 'CCC'),
    bodyType: fc.constantFrom('van' as const, 'estate' as const),
    package: fc.constantFrom('full', 'cavity'),
    temperature: fc.option(fc.integer({ min: -8, max: 30 }), { nil: undefined }),
    products: fc.array(
      fc.record({
        product: fc.constantFrom('CW1', 'UW1'),
        ml: fc.oneof(fc.constantFrom(0, 2800, 5200), fc.nat(6000)),
      }),
      { maxLength: 3 },
    ),
  });

  it('given any jobs, agrees with a recount of each car', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(fc.array(drawn, { maxLength: 40 }), async (cars) => {
        run += 1;
        const day = addDays('2023-01-01', run);
        await small.store.queue.write(() => {
          cars.forEach((each, index) =>
            small.write(
              each.branch,
              `${run}-${index}`,
              car(day, {
                package: each.package,
                vehicle: { ...VAN, bodyType: each.bodyType },
                products: each.products,
                workshop: { temperatureC: each.temperature },
              }),
            ),
          );
        });
        const own = cars.filter(({ branch }) => branch !== 'CCC');
        const answer = ask(day);
        expect(answer.jobs).toBe(own.length);
        const ml = (each: (typeof cars)[number], product: string) =>
          sum(each.products.filter((line) => line.product === product).map((line) => line.ml));
        const lists = (each: (typeof cars)[number], product: string) =>
          each.products.some((line) => line.product === product);
        const rows = new Map(
          answer.use.map((row) => [`${row.product} ${row.package} ${row.bodyType}`, row]),
        );
        for (const product of ['CW1', 'UW1']) {
          for (const pack of ['full', 'cavity']) {
            for (const bodyType of ['van', 'estate']) {
              const normed = product === 'CW1' && pack === 'full' && bodyType === 'van';
              const cell = own
                .filter((each) => each.package === pack && each.bodyType === bodyType)
                .filter((each) => normed || lists(each, product));
              const row = rows.get(`${product} ${pack} ${bodyType}`);
              expect(row?.cars ?? 0).toBe(cell.length);
              if (!row) continue;
              const values = cell.map((each) => ml(each, product)).sort((a, b) => a - b);
              expect(row.carsListing).toBe(values.filter((value) => value > 0).length);
              expect(row.normMl).toBe(normed ? 4000 : null);
              expect(row.under).toBe(normed ? values.filter((v) => v < 2800).length : null);
              expect(row.over).toBe(normed ? values.filter((v) => v > 5200).length : null);
              if (values.length < 5) {
                expect([row.meanMl, row.medianMl, row.costPerCarCents]).toEqual([null, null, null]);
                continue;
              }
              expect(row.meanMl).toBeCloseTo(mean(values), 9);
              expect(row.medianMl).toBeCloseTo(quantileSorted(values, 0.5), 9);
              const rate = product === 'CW1' ? 1200 : 999;
              const costs = cell.map((each) =>
                sum(
                  each.products
                    .filter((line) => line.product === product)
                    .map((line) => Math.floor((line.ml * rate) / 1000 + 0.5)),
                ),
              );
              expect(row.costPerCarCents).toBe(Math.floor(sum(costs) / values.length + 0.5));
            }
          }
        }
        for (const row of answer.branches) {
          const normed = own.filter(
            (each) =>
              each.branch === row.branch && each.package === 'full' && each.bodyType === 'van',
          );
          expect(row.cars).toBe(normed.length);
          if (normed.length < 5) expect(row.ratioToNorm).toBeNull();
          else {
            const used = sum(normed.map((each) => ml(each, 'CW1')));
            expect(row.ratioToNorm).toBeCloseTo(used / (4000 * normed.length), 9);
          }
        }
        for (const row of answer.temperature) {
          const warm = own.filter(
            (each) => ml(each, row.product) > 0 && each.temperature !== undefined,
          );
          expect(row.cars).toBe(warm.length);
          expect(sum(row.classes.map(({ cars: n }) => n))).toBe(warm.length);
        }
      }),
      { numRuns: 40 },
    );
  });
});

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
