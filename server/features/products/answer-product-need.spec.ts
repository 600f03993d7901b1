import { sql } from '#db/database';
import { putBookingRow } from '#db/queries/bookings';
import { addDays } from '#shared/domain/calendar';
import { unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerProductNeed } from './answer-product-need';

/** A Wednesday: the coming weeks begin on the 9th. */
const TODAY = '2026-02-04';
const PERIOD = { from: '2026-01-05', to: TODAY };

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
});
afterEach(() => small.close());

const ask = (branches = ['AAA', 'BBB'], filters = {}, period = PERIOD) =>
  answerProductNeed(small.store.scoped(small.scope(...branches)), {
    ...{ period, filters, today: TODAY },
  });
const van = (on: string, ml: number) => ({
  ...unbilledJob(on),
  products: [{ product: 'CW1', ml }],
});
async function book(branch: string, ref: string, expectedOn: string, code = 'full') {
  const packageId = small.store.state.package(code)?.id ?? 0;
  const booking = { ref, expectedOn, packageId, bodyType: 'van' as const };
  await small.store.queue.write(() =>
    putBookingRow(small.store.unscoped, small.branch(branch), booking),
  );
}
async function close(branch: string, on: string) {
  await small.store.queue.write(() => {
    const query = sql('branches').where({ code: branch }).update({ closed_on: on });
    small.store.unscoped.run(query);
  });
}

describe('answerProductNeed', () => {
  it('given no job and no booking, needs nothing in eight weeks named', () => {
    const answer = ask();
    expect(answer).toMatchObject({
      ...{ jobs: 0, needs: [], carsWithoutUse: 0, missingCosts: [] },
      coming: { from: '2026-02-09', to: '2026-04-05' },
    });
    expect(answer.weeks.map(({ week }) => week)).toEqual([
      ...['2026-W07', '2026-W08', '2026-W09', '2026-W10', '2026-W11', '2026-W12'],
      ...['2026-W13', '2026-W14'],
    ]);
    expect(answer.weeks[0]).toEqual({ week: '2026-W07', booked: 0, usual: 0 });
    expect(ask([])).toMatchObject({ jobs: 0, needs: [], scope: { branches: [] } });
  });

  it('given whole weeks that are over, lets their mean stand in for weeks without bookings', async () => {
    // Two, one, none and one car in the four whole weeks; the fifth is not over and counts for use alone.
    for (const [index, on] of ['2026-01-05', '2026-01-07', '2026-01-12', '2026-01-26'].entries()) {
      await small.putJob('AAA', `j-${index}`, van(on, 4000));
    }
    await small.putJob('AAA', 'now', van('2026-02-03', 5000));
    const answer = ask();
    expect(answer.jobs).toBe(5);
    expect(answer.weeks.map(({ usual }) => usual)).toEqual(Array(8).fill(1));
    // Eight cars of 4.2 litres at 12.00 a litre.
    const [need] = answer.needs;
    expect(need).toMatchObject({ product: 'CW1', costCents: 40_320 });
    expect(need?.ml).toBeCloseTo(33_600, 6);
    // Counts 2, 1, 0, 1 vary by 2/3; uses of 4000 four times and 5000 by 200,000.
    const count = (8 * 2) / 3 + (64 * 2) / 3 / 4;
    const variance = 8 * 200_000 + count * 4200 ** 2 + (64 * 200_000) / 5;
    expect(need?.upperMl).toBeCloseTo(33_600 + 1.959964 * Math.sqrt(variance), 5);
    expect(need?.lowerMl).toBe(Math.max(0, 33_600 - 1.959964 * Math.sqrt(variance)));
  });

  it('given bookings, fills weeks up to the usual number and never below what is booked', async () => {
    for (let week = 0; week < 4; week += 1) {
      for (const n of [0, 1]) {
        await small.putJob('AAA', `j-${week}-${n}`, van(addDays('2026-01-05', 7 * week), 4000));
      }
    }
    await book('AAA', 'b-1', '2026-02-09');
    for (const n of [1, 2, 3]) await book('AAA', `c-${n}`, '2026-02-22');
    // This week's and those after the eight are not asked about.
    await book('AAA', 'this-week', '2026-02-08');
    await book('AAA', 'too-late', '2026-04-06');
    await book('BBB', 'other', '2026-04-05');
    const { weeks, needs } = ask();
    expect(weeks.map(({ booked, usual }) => [booked, usual])).toEqual([
      ...[
        [1, 1],
        [3, 0],
      ],
      ...Array<number[]>(5).fill([0, 2]),
      [1, 2],
    ]);
    // Eight weeks of two, one car more in one of them, one of the other branch by the norm.
    expect(needs[0]?.ml).toBeCloseTo(18 * 4000, 6);
    expect(needs[0]?.upperMl).toBe(needs[0]?.ml);
  });

  it('given a branch that began or closed within the period, counts only the weeks it was there', async () => {
    await small.putJob('AAA', 'first', van('2026-01-21', 4000));
    await small.putJob('AAA', 'second', van('2026-01-28', 4000));
    expect(ask().weeks[0]?.usual).toBe(1);
    await close('AAA', '2026-02-20');
    expect(ask().weeks.map(({ usual }) => usual)).toEqual([1, 1, 0, 0, 0, 0, 0, 0]);
  });

  it('given a kind of car with neither five cars nor a norm, counts it apart', async () => {
    await book('AAA', 'c', '2026-02-10', 'cavity');
    await book('AAA', 'f', '2026-02-10');
    const answer = ask();
    expect(answer.carsWithoutUse).toBe(1);
    expect(answer.needs).toEqual([
      { product: 'CW1', ml: 4000, lowerMl: 4000, upperMl: 4000, costCents: 4800 },
    ]);
    const packageIds = [small.store.state.package('cavity')?.id ?? 0];
    expect(ask(['AAA'], { packageIds })).toMatchObject({ needs: [], carsWithoutUse: 1 });
  });

  it('given a product without a cost today, names it and has no cost for it', async () => {
    for (let index = 0; index < 5; index += 1) {
      const products = [{ product: 'UW1', ml: 100 }];
      await small.putJob('AAA', `u-${index}`, { ...unbilledJob('2026-01-06'), products });
    }
    const { needs, missingCosts } = ask();
    expect(needs.map(({ product, costCents }) => [product, costCents])).toEqual([['UW1', null]]);
    expect(missingCosts).toEqual([{ product: 'UW1', on: TODAY }]);
  });

  it('given branches out of scope, is the same whatever they did', async () => {
    await small.putJob('AAA', 'own', van('2026-01-06', 4000));
    const before = JSON.stringify(ask(['AAA']));
    await small.putJob('CCC', 'other', van('2026-01-06', 1000));
    await book('CCC', 'other', '2026-02-10');
    expect(JSON.stringify(ask(['AAA']))).toBe(before);
  });

  it('given a period without a whole week, has no usual cars', async () => {
    await small.putJob('AAA', 'own', van('2026-01-06', 4000));
    const period = { from: '2026-01-06', to: '2026-01-11' };
    expect(ask(['AAA'], {}, period).weeks[0]?.usual).toBe(0);
  });
});
