import { sql } from '#db/database';
import type { MarginAnswer } from '#shared/contracts/margin';
import { keptJob, unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerMargin } from './answer-margin';

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
});
afterEach(() => small.close());

const TODAY = '2026-03-04';

function ask(from: string, to: string, branches = ['AAA']): MarginAnswer {
  const db = small.store.scoped(small.scope(...branches));
  return answerMargin(db, { period: { from, to }, filters: {}, today: TODAY });
}
describe('answerMargin', () => {
  it('given one job, sums its lines and has neither limits nor trend', async () => {
    await small.putJob('AAA', 'one', {
      ...keptJob('2026-01-28', 0),
      estimate: { priceCents: 50_000, stages: { strip: 60, apply: 120 } },
      actual: { stages: { strip: 70, apply: 130, repair: 31 } },
      products: [{ product: 'CW1', ml: 3900 }],
      consumables: [{ kind: 'trim_clip', quantity: 3, unitCostCents: 45 }],
      boughtInCents: 700,
    });
    const answer = ask('2026-01-26', '2026-02-01');
    // 36.00 an hour is 60 cents a minute; 12.00 a litre is 1.2 cents a millilitre; the fee 5 %.
    const margin = 100_000 - 13_860 - 4_680 - 135 - 700 - 5_000;
    const expected = 50_000 - 10_800 - 4_800 - 2_500;
    expect(answer.weeks).toEqual([
      {
        week: '2026-W05',
        jobs: 1,
        unbilled: 0,
        unbilledCostCents: 0,
        revenueCents: 100_000,
        labourCents: 13_860,
        productCents: 4_680,
        consumablesCents: 135,
        boughtInCents: 700,
        feeCents: 5_000,
        marginCents: margin,
        marginShare: margin / 100_000,
        expectedMarginCents: expected,
        signal: null,
        whole: true,
      },
    ]);
    expect(answer.bridge).toEqual({
      cars: 1,
      expectedMarginCents: expected,
      priceCents: 50_000,
      plannedLabourCents: -1_200,
      rotLabourCents: -1_860,
      productCents: 120,
      consumablesCents: -835,
      feeCents: -2_500,
      marginCents: margin,
    });
    expect(answer).toMatchObject({ jobs: 1, withoutCost: 0, missingCosts: [] });
    expect(answer).toMatchObject({ limits: null, trend: null, targetMarginShare: null });
  });

  it('given an empty scope, lists every week with zeros', () => {
    const answer = ask('2026-01-01', '2026-01-14', []);
    expect(answer.scope).toEqual({ regions: [], branches: [] });
    expect(answer.weeks.map((week) => week.week)).toEqual(['2026-W01', '2026-W02', '2026-W03']);
    for (const week of answer.weeks) {
      expect(week).toMatchObject({ jobs: 0, revenueCents: 0, marginShare: null, signal: null });
    }
    expect(answer).toMatchObject({ jobs: 0, limits: null, trend: null });
    expect(answer.bridge).toMatchObject({ cars: 0, expectedMarginCents: 0, marginCents: 0 });
    expect(Object.is(answer.bridge.consumablesCents, 0)).toBe(true);
  });

  it('given a year of 53 weeks, lists the 53rd', async () => {
    await small.putJob('AAA', 'last', keptJob('2021-01-03', 0.4));
    const answer = ask('2020-12-21', '2021-01-10');
    expect(answer.weeks.map(({ week, jobs }) => [week, jobs])).toEqual([
      ['2020-W52', 0],
      ['2020-W53', 1],
      ['2021-W01', 0],
    ]);
  });

  it('given unbilled work, shows what it cost beside the margin and never in it', async () => {
    await small.putJob('AAA', 'billed', keptJob('2026-01-27', 0.5));
    await small.putJob('AAA', 'open', {
      ...unbilledJob('2026-01-28'),
      actual: { stages: { clean: 100, repair: 10 } },
      boughtInCents: 300,
    });
    const [week] = ask('2026-01-26', '2026-02-01').weeks;
    expect(week).toMatchObject({
      jobs: 2,
      unbilled: 1,
      unbilledCostCents: 6_900,
      revenueCents: 100_000,
      labourCents: 0,
      marginShare: 0.5,
    });
  });

  it('given a week with nothing but unbilled work, has no share for it', async () => {
    await small.putJob('AAA', 'open', unbilledJob('2026-01-28'));
    const [week] = ask('2026-01-26', '2026-02-01').weeks;
    expect(week).toMatchObject({ jobs: 1, unbilled: 1, marginShare: null, signal: null });
  });

  it('given jobs without a cost, counts them apart and names each cost once with its first day (rule 11)', async () => {
    await small.putJob('AAA', 'dear', {
      ...keptJob('2026-01-28', 0.5),
      products: [{ product: 'UW1', ml: 100 }],
    });
    await small.putJob('AAA', 'clips', {
      ...keptJob('2026-01-29', 0.5),
      products: [{ product: 'UW1', ml: 100 }],
      consumables: [{ kind: 'other', quantity: 1 }],
    });
    await small.putJob('AAA', 'early', { ...keptJob('2019-12-31', 0.5) });
    const answer = ask('2026-01-26', '2026-02-01');
    expect(answer).toMatchObject({ jobs: 2, withoutCost: 2 });
    expect(answer.missingCosts).toEqual([
      { kind: 'consumable', code: 'other', on: '2026-01-29' },
      { kind: 'product', code: 'UW1', on: '2026-01-28' },
    ]);
    expect(answer.weeks[0]).toMatchObject({ jobs: 2, revenueCents: 0, marginShare: null });
    expect(ask('2019-12-30', '2020-01-05').missingCosts).toEqual([
      { kind: 'hourlyCost', code: 'AAA', on: '2019-12-31' },
    ]);
  });

  it('given a norm product without a cost, leaves out the expectation only', async () => {
    await small.change({
      kind: 'norm',
      package: 'cavity',
      bodyType: 'van',
      lines: [{ product: 'UW1', ml: 500 }],
    });
    await small.putJob('AAA', 'one', {
      ...keptJob('2026-01-28', 0.5),
      package: 'cavity',
      estimate: { priceCents: 50_000, stages: { strip: 60 } },
    });
    const answer = ask('2026-01-26', '2026-02-01');
    expect(answer).toMatchObject({ withoutCost: 0, bridge: { cars: 0, marginCents: 0 } });
    expect(answer.missingCosts).toEqual([{ kind: 'product', code: 'UW1', on: '2026-01-28' }]);
    expect(answer.weeks[0]).toMatchObject({ marginCents: 50_000, expectedMarginCents: 0 });
  });
});

describe('answerMargin, target (rule 80)', () => {
  it('given one branch, has its own target or else the network’s; given several, the network’s', async () => {
    const target = (...branches: string[]) =>
      ask('2026-01-26', '2026-02-01', branches).targetMarginShare;
    await small.store.queue.write(() => {
      small.store.unscoped.run(sql('network').update({ target_margin_share: 0.35 }));
      small.store.unscoped.run(
        sql('branches').where({ code: 'AAA' }).update({ target_margin_share: 0.4 }),
      );
    });
    expect(target('AAA')).toBe(0.4);
    expect(target('BBB')).toBe(0.35);
    expect(target('AAA', 'BBB')).toBe(0.35);
    expect(target()).toBe(0.35);
  });
});
