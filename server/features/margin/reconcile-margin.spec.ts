import fc from 'fast-check';
import { addDays, isoWeek } from '#shared/domain/calendar';
import type { SentJob } from '#shared/domain/normalise-job';
import type { RecordedJob, StageMinutes } from '#shared/domain/recorded-job';
import { STAGES } from '#shared/domain/vocabulary';
import { recountJob } from '../../../test/support/recount-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerMargin } from './answer-margin';

let small: SmallStore;
beforeAll(async () => {
  small = await SmallStore.make();
  await small.change({ kind: 'hourlyCost', code: 'AAA', from: '2020-03-04', value: 3777 });
  await small.change({ kind: 'product', code: 'CW1', from: '2020-02-11', value: 1313 });
  await small.change({ kind: 'fee', from: '2020-02-20', value: 61_234 });
});
afterAll(() => small.close());

/** Days of one run of the property; each run has days of its own, so that one store serves all. */
const DAYS = 40;
const FIRST = '2020-01-03';

const stages = fc
  .array(fc.nat(400), { minLength: STAGES.length, maxLength: STAGES.length })
  .map((minutes): StageMinutes =>
    Object.fromEntries(STAGES.map((stage, index) => [stage, minutes[index]])),
  );
const job = fc.record({
  branch: fc.constantFrom('AAA', 'BBB', 'CCC'),
  day: fc.nat(DAYS - 1),
  sent: fc.record({
    vehicle: fc.record({
      make: fc.constant('Vela'),
      model: fc.constant('Ono'),
      bodyType: fc.constantFrom('van' as const, 'suv' as const),
      firstRegistered: fc.constant('2010-01'),
    }),
    package: fc.constantFrom('full', 'cavity'),
    estimate: fc.option(fc.record({ priceCents: fc.nat(99_999), stages }), { nil: undefined }),
    actual: fc.record({ stages }),
    // UW1 has no cost: such a job is left out of every margin.
    products: fc.subarray([
      { product: 'CW1', ml: 3333 },
      { product: 'CW1', ml: 17 },
      { product: 'UW1', ml: 5 },
    ]),
    consumables: fc.subarray([{ kind: 'trim_clip' as const, quantity: 7, unitCostCents: 43 }]),
    boughtInCents: fc.nat(9_999),
    invoice: fc.option(fc.record({ totalCents: fc.nat(150_000) }), { nil: undefined }),
  }),
});

describe('answerMargin, on generated jobs', () => {
  it('given any jobs, agrees to the cent with a recount of each, by week and over all, and its bridge adds up', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(fc.array(job, { maxLength: 25 }), async (drawn) => {
        run += 1;
        const from = addDays(FIRST, DAYS * run);
        const jobs = drawn.map(({ branch, day, sent }) => ({
          branch,
          job: { ...sent, completedOn: addDays(from, day) } satisfies SentJob,
        }));
        await small.store.queue.write(() => {
          jobs.forEach((each, index) => small.write(each.branch, `${run}-${index}`, each.job));
        });
        const period = { from, to: addDays(from, DAYS - 1) };
        const branches = ['AAA', 'BBB'];
        const answer = answerMargin(small.store.scoped(small.scope(...branches)), {
          period,
          filters: {},
          today: '2030-01-01',
        });
        const counted = jobs
          .filter(({ branch }) => branches.includes(branch))
          .map(({ branch, job: sent }) => ({
            week: isoWeek(sent.completedOn),
            billed: sent.invoice !== undefined,
            ...recountJob(small.store, branch, sent satisfies RecordedJob),
          }));
        const sum = (values: (bigint | undefined)[]) =>
          Number(values.reduce<bigint>((all, value) => all + (value ?? 0n), 0n));
        const kept = counted.filter(({ billed, margin }) => billed && margin !== undefined);
        const bridged = kept.filter(({ expectedMargin }) => expectedMargin !== undefined);
        for (const week of answer.weeks) {
          const own = ({ week: name }: { week: string }) => name === week.week;
          expect(week.jobs).toBe(counted.filter(own).length);
          expect(week.unbilled).toBe(counted.filter(own).filter(({ billed }) => !billed).length);
          expect(week.marginCents).toBe(sum(kept.filter(own).map(({ margin }) => margin)));
          expect(week.expectedMarginCents).toBe(
            sum(bridged.filter(own).map(({ expectedMargin }) => expectedMargin)),
          );
          expect(week.marginCents).toBe(
            week.revenueCents -
              week.labourCents -
              week.productCents -
              week.consumablesCents -
              week.boughtInCents -
              week.feeCents,
          );
        }
        const { bridge } = answer;
        expect(bridge.cars).toBe(bridged.length);
        expect(bridge.marginCents).toBe(sum(bridged.map(({ margin }) => margin)));
        expect(bridge.expectedMarginCents).toBe(
          sum(bridged.map(({ expectedMargin }) => expectedMargin)),
        );
        expect(
          bridge.expectedMarginCents +
            bridge.priceCents +
            bridge.plannedLabourCents +
            bridge.rotLabourCents +
            bridge.productCents +
            bridge.consumablesCents +
            bridge.feeCents,
        ).toBe(bridge.marginCents);
        expect(answer.jobs).toBe(counted.length);
        expect(answer.withoutCost).toBe(
          counted.filter(({ margin }) => margin === undefined).length,
        );
        expect(answer.jobs).toBe(total(answer.weeks.map((week) => week.jobs)));
      }),
      { numRuns: 40 },
    );
  });
});

function total(values: number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
