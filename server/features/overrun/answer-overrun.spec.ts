import fc from 'fast-check';
import { mean, quantileSorted } from 'simple-statistics';
import type { OverrunAnswer, OverrunGrouping } from '#shared/contracts/overrun';
import { addDays } from '#shared/domain/calendar';
import type { SentJob } from '#shared/domain/normalise-job';
import { STAGES } from '#shared/domain/vocabulary';
import { unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerOverrun } from './answer-overrun';

let small: SmallStore;
beforeAll(async () => {
  small = await SmallStore.make();
});
afterAll(() => small.close());

const worked = (on: string, estimated: number | null, actual: number): SentJob => ({
  ...unbilledJob(on),
  ...(estimated !== null && { estimate: { priceCents: 1, stages: { strip: estimated } } }),
  actual: { stages: { strip: actual } },
});

function ask(
  by: OverrunGrouping,
  day: string,
  branches = ['AAA', 'BBB', 'CCC'],
  days = 1,
): OverrunAnswer {
  const period = { from: day, to: addDays(day, days - 1) };
  return answerOverrun(small.store.scoped(small.scope(...branches)), { period, filters: {}, by });
}
const keys = (answer: OverrunAnswer) => answer.groups.map((group) => group.key);
const byKey = (answer: OverrunAnswer) =>
  Object.fromEntries(answer.groups.map(({ key, ...figures }) => [key, figures]));

describe('answerOverrun', () => {
  it('given five cars, has the ratio of sums, its error and type 7 quantiles', async () => {
    const minutes = [
      [100, 110],
      [100, 90],
      [200, 260],
      [50, 100],
      [150, 150],
    ] as const;
    for (const [index, [estimated, actual]] of minutes.entries()) {
      await small.putJob('AAA', `five-${index}`, worked('2026-01-05', estimated, actual));
    }
    const { overall, jobs, withoutEstimate } = ask('stage', '2026-01-05');
    // Ratios .9 1 1.1 1.3 2: the median is the third, P80 lies a fifth of the way from the fourth to the last.
    expect(overall).toEqual({
      cars: 5,
      estimatedMinutes: 600,
      actualMinutes: 710,
      ratio: 710 / 600,
      ratioStandardError: expect.closeTo(errorOf(minutes), 12),
      median: 1.1,
      p80: expect.closeTo(1.3 + 0.2 * 0.7, 12),
      p95: expect.closeTo(1.3 + 0.8 * 0.7, 12),
      allowance: expect.closeTo(0.44, 12),
    });
    expect({ jobs, withoutEstimate }).toEqual({ jobs: 5, withoutEstimate: 0 });
  });

  it('given four cars, withholds every ratio and keeps the counts (rule 13)', async () => {
    for (const index of [1, 2, 3, 4]) {
      await small.putJob('AAA', `four-${index}`, worked('2026-01-06', 100, 120));
    }
    expect(ask('branch', '2026-01-06').groups).toEqual([
      {
        key: 'AAA',
        cars: 4,
        estimatedMinutes: 400,
        actualMinutes: 480,
        ratio: null,
        ratioStandardError: null,
        median: null,
        p80: null,
        p95: null,
        allowance: null,
      },
    ]);
  });

  it('given jobs without an estimate or with one of no minutes, counts them apart (rules 12 and 29)', async () => {
    await small.putJob('AAA', 'none', worked('2026-01-07', null, 50));
    await small.putJob('AAA', 'zero', worked('2026-01-07', 0, 50));
    await small.putJob('AAA', 'some', worked('2026-01-07', 10, 50));
    const answer = ask('stage', '2026-01-07');
    expect(answer).toMatchObject({ jobs: 3, withoutEstimate: 2 });
    expect(answer.overall).toMatchObject({ cars: 1, estimatedMinutes: 10, actualMinutes: 50 });
  });

  it('given cars quicker than estimated, has an allowance below 0 (rule 27)', async () => {
    for (const index of [1, 2, 3, 4, 5]) {
      await small.putJob('AAA', `quick-${index}`, worked('2026-01-08', 100, 80));
    }
    expect(ask('stage', '2026-01-08').overall.allowance).toBeCloseTo(-0.2, 12);
  });

  it('given a stage that few estimates name, has its sums over all and no quantile (rule 28)', async () => {
    for (const index of [1, 2, 3, 4, 5, 6]) {
      await small.putJob('AAA', `rot-${index}`, {
        ...unbilledJob('2026-01-09'),
        estimate: { priceCents: 1, stages: { strip: 60, ...(index <= 4 && { repair: 10 }) } },
        actual: { stages: { strip: 60, repair: 30 } },
      });
    }
    const answer = ask('stage', '2026-01-09');
    expect(keys(answer)).toEqual([...STAGES]);
    const { repair, dry, strip } = byKey(answer);
    expect(repair).toMatchObject({ cars: 6, estimatedMinutes: 40, actualMinutes: 180, ratio: 4.5 });
    expect(repair).toMatchObject({ median: null, p80: null, p95: null, allowance: null });
    expect(dry).toMatchObject({ cars: 6, ratio: null, ratioStandardError: null, median: null });
    expect(strip).toMatchObject({ ratio: 1, ratioStandardError: 0, median: 1, allowance: 0 });
  });

  it('given each grouping, names its keys in their order and leaves empty groups out (rule 30)', async () => {
    const day = '2026-01-12';
    const put = (branch: string, ref: string, over: Partial<SentJob>) =>
      small.putJob(branch, ref, { ...worked(day, 100, 120), ...over });
    const vehicle = worked(day, 1, 1).vehicle;
    await put('BBB', 'k1', { package: 'cavity', vehicle: { ...vehicle, bodyType: 'suv' } });
    await put('AAA', 'k2', { vehicle: { ...vehicle, firstRegistered: '2024-01' } });
    await put('AAA', 'k3', {
      vehicle: { ...vehicle, bodyType: 'camper', firstRegistered: '1999-01' },
      findings: [
        { zone: 'floor', side: 'left', seenAs: 'holed', structural: false, action: 'deferred' },
      ],
    });
    await put('AAA', 'k4', { completedOn: '2026-02-02' });
    const asked = (by: OverrunGrouping) => keys(ask(by, day, ['AAA', 'BBB', 'CCC'], 30));
    expect(asked('branch')).toEqual(['AAA', 'BBB']);
    expect(asked('region')).toEqual(['COAST']);
    expect(asked('ageBand')).toEqual(['0-4', '15-19', '20+']);
    expect(asked('package')).toEqual(['cavity', 'full']);
    expect(asked('bodyType')).toEqual(['camper', 'suv', 'van']);
    expect(asked('month')).toEqual(['2026-01', '2026-02']);
    expect(asked('rotFound')).toEqual(['found', 'not_found']);
    expect(byKey(ask('rotFound', day))).toMatchObject({
      found: { cars: 1 },
      not_found: { cars: 2 },
    });
  });

  it('given an empty scope, has seven stages of no car, or no group at all', () => {
    expect(ask('stage', '2026-01-05', [])).toMatchObject({ jobs: 0, withoutEstimate: 0 });
    expect(keys(ask('stage', '2026-01-05', []))).toEqual([...STAGES]);
    expect(ask('month', '2026-01-05', []).groups).toEqual([]);
  });
});

describe('answerOverrun, on generated jobs', () => {
  const stages = fc
    .array(fc.oneof(fc.constant(0), fc.nat(400)), { minLength: 7, maxLength: 7 })
    .map((minutes) => Object.fromEntries(STAGES.map((stage, at) => [stage, minutes[at] ?? 0])));
  const drawn = fc.record({
    branch: fc.constantFrom('AAA', 'BBB'),
    estimated: fc.option(stages, { nil: undefined }),
    actual: stages,
  });

  it('given any jobs, agrees with a library on every group, and the stages add up to the whole', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(fc.array(drawn, { maxLength: 30 }), async (jobs) => {
        run += 1;
        const day = addDays('2022-01-01', run);
        await small.store.queue.write(() => {
          jobs.forEach(({ branch, estimated, actual }, index) =>
            small.write(branch, `${run}-${index}`, {
              ...unbilledJob(day),
              estimate: estimated && { priceCents: 1, stages: estimated },
              actual: { stages: actual },
            }),
          );
        });
        const counted = jobs
          .map(({ branch, estimated, actual }) => ({
            branch,
            pair: [total(Object.values(estimated ?? {})), total(Object.values(actual))] as const,
          }))
          .filter(({ pair }) => pair[0] > 0);
        const answer = ask('stage', day);
        expect(answer.jobs).toBe(jobs.length);
        expect(answer.overall.cars + answer.withoutEstimate).toBe(jobs.length);
        agrees(
          answer.overall,
          counted.map(({ pair }) => pair),
        );
        const over = (figures: { actualMinutes: number; estimatedMinutes: number }) =>
          figures.actualMinutes - figures.estimatedMinutes;
        expect(total(answer.groups.map(over))).toBe(over(answer.overall));
        const branches = byKey(ask('branch', day));
        for (const [key, figures] of Object.entries(branches)) {
          agrees(
            figures,
            counted.filter(({ branch }) => branch === key).map(({ pair }) => pair),
          );
        }
      }),
      { numRuns: 40 },
    );
  });
});

type Figures = OverrunAnswer['overall'];

/** Library reference of this spec: simple-statistics 7.12.1 for means and the median; its other quantiles are of another type, so those are written out. */
function agrees(figures: Figures, pairs: readonly (readonly [number, number])[]): void {
  expect(figures.cars).toBe(pairs.length);
  expect(figures.estimatedMinutes).toBe(total(pairs.map(([estimated]) => estimated)));
  expect(figures.actualMinutes).toBe(total(pairs.map(([, actual]) => actual)));
  if (pairs.length < 5) {
    const { ratio, ratioStandardError, median, p80, p95, allowance } = figures;
    expect([ratio, ratioStandardError, median, p80, p95, allowance]).toEqual(Array(6).fill(null));
    return;
  }
  const ratios = pairs.map(([estimated, actual]) => actual / estimated).sort((a, b) => a - b);
  expect(figures.ratio).toBeCloseTo(
    mean(pairs.map(([, actual]) => actual)) / mean(pairs.map(([estimated]) => estimated)),
    9,
  );
  expect(figures.ratioStandardError).toBeCloseTo(errorOf(pairs), 9);
  expect(figures.median).toBeCloseTo(quantileSorted(ratios, 0.5), 9);
  expect(figures.p80).toBeCloseTo(typeSeven(ratios, 0.8), 9);
  expect(figures.p95).toBeCloseTo(typeSeven(ratios, 0.95), 9);
}

/** Rule 26 written out: sqrt(Σ(a − r·e)² / (n(n − 1))) / ē. */
function errorOf(pairs: readonly (readonly [number, number])[]): number {
  const n = pairs.length;
  const ratio = total(pairs.map(([, actual]) => actual)) / total(pairs.map(([e]) => e));
  const squares = total(pairs.map(([estimated, actual]) => (actual - ratio * estimated) ** 2));
  return Math.sqrt(squares / (n * (n - 1))) / (total(pairs.map(([e]) => e)) / n);
}

/** Type 7 by its definition: the value at 1 + (n − 1)p, linear between neighbours. */
function typeSeven(sorted: readonly number[], p: number): number {
  const at = (sorted.length - 1) * p;
  const [below, above] = [sorted[Math.floor(at)] ?? 0, sorted[Math.ceil(at)] ?? 0];
  return below + (at % 1) * (above - below);
}

function total(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
