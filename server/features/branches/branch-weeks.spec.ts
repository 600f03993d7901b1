import type { BranchWeeksAnswer } from '#shared/contracts/branches';
import { addDays } from '#shared/domain/calendar';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import { keptJob } from '../../../test/support/kept-job';
import { carAged, found } from '../../../test/support/rot-store';
import type { SmallStore } from '../../../test/support/small-store';
import { makeWarrantyStore, openClaim, writeClaim } from '../../../test/support/warranty-store';
import { answerMargin } from '../margin/answer-margin';
import { answerBranchWeeks } from './answer-branch-weeks';

let small: SmallStore;
beforeEach(async () => {
  small = await makeWarrantyStore();
}, 30_000);
afterEach(() => small.close());

const TODAY = '2026-03-04';

function ask(
  measure: BranchMeasure,
  from: string,
  to: string,
  { branches = ['AAA', 'BBB'], today = TODAY }: { branches?: string[]; today?: string } = {},
): BranchWeeksAnswer {
  const db = small.store.scoped(small.scope(...branches));
  return answerBranchWeeks(db, { measure, period: { from, to }, filters: {}, today });
}

const worked = (on: string, minutes: number) =>
  carAged(on, 3, {
    estimate: { priceCents: 50_000, stages: { strip: 100 } },
    actual: { stages: { strip: minutes } },
  });

describe('answerBranchWeeks', () => {
  it('given weekly margins with gaps and weeks before the period, equals the margin answer of each branch', async () => {
    const shares: Record<string, (number | null)[]> = {
      AAA: [
        ...[0.4, 0.42, null, 0.38, 0.4, 0.42, 0.38, 0.44, 0.4, 0.36, 0.48],
        ...[0.41, 0.42, 0.43, 0.44, 0.43, 0.42, 0.43, 0.44, null, 0.43, 0.1],
      ],
      BBB: [null, null, 0.3, 0.31, null, 0.3, 0.29, 0.3, 0.31, 0.3, 0.3, 0.9],
      CCC: [0.5, 0.4],
    };
    await small.store.queue.write(() => {
      for (const [branch, weeks] of Object.entries(shares)) {
        weeks.forEach((share, week) => {
          const on = addDays('2025-09-01', 7 * week + 2);
          if (share !== null) small.write(branch, `w-${on}`, keptJob(on, share));
        });
      }
    });
    let judged = 0;
    for (const [from, to, today] of [
      ['2025-09-01', '2026-02-01', TODAY],
      ['2025-10-22', '2026-02-01', TODAY],
      ['2025-12-01', '2025-12-14', TODAY],
      ['2025-11-03', '2026-01-25', '2026-01-25'],
      ['2026-01-26', '2026-02-01', TODAY],
    ] as const) {
      const told = ask('margin', from, to, { branches: ['AAA', 'BBB', 'CCC'], today });
      for (const { branch, weeks, limits } of told.branches) {
        const db = small.store.scoped(small.scope(branch));
        const margin = answerMargin(db, { period: { from, to }, filters: {}, today });
        expect(limits).toEqual(margin.limits);
        expect(weeks.map(({ week, value, signal }) => ({ week, value, signal }))).toEqual(
          margin.weeks.map(({ week, marginShare: value, signal }) => ({ week, value, signal })),
        );
        judged += weeks.filter(({ signal }) => signal !== null).length;
      }
    }
    expect(judged).toBeGreaterThan(3);
  });

  it('given few cars in a week, keeps its value back, from the limits too; an empty week counts none (rules 13 and 54)', async () => {
    await small.store.queue.write(() => {
      [5, 4, 0, 5].forEach((cars, week) => {
        for (let car = 0; car < cars; car += 1) {
          const on = addDays('2026-01-05', 7 * week + 1);
          small.write('AAA', `${on}-${car}`, worked(on, 100 + 10 * car));
        }
      });
    });
    const { jobs, branches } = ask('overrun', '2026-01-05', '2026-02-01');
    expect(jobs).toBe(14);
    expect(branches.map(({ branch }) => branch)).toEqual(['AAA']);
    const [{ weeks, limits, target }] = branches as [BranchWeeksAnswer['branches'][number]];
    expect(weeks.map(({ cars, value }) => [cars, value])).toEqual([
      [5, 1.2],
      [4, null],
      [0, null],
      [5, 1.2],
    ]);
    expect([limits, target]).toEqual([null, null]);
  });

  it('given ten weeks of five cars, judges the last by the nine before it (rule 5)', async () => {
    const minutes = [100, 104, 96, 100, 104, 96, 108, 100, 92, 160];
    await small.store.queue.write(() => {
      minutes.forEach((each, week) => {
        const on = addDays('2025-11-03', 7 * week + 1);
        for (let car = 0; car < 5; car += 1) small.write('AAA', `${on}-${car}`, worked(on, each));
      });
    });
    const [{ weeks, limits }] = ask('overrun', '2025-11-03', '2026-01-11').branches as [
      BranchWeeksAnswer['branches'][number],
    ];
    // Mean 1; ranges .04 .08 .04 .04 .08 .12 .08 .08, mean 0.07; 3 / 1.128 × 0.07 = 0.1861702127…
    expect(limits).toMatchObject({ baselineWeeks: 9 });
    expect(limits!.centre).toBeCloseTo(1, 12);
    expect(limits!.upper).toBeCloseTo(1.1861702128, 9);
    expect(weeks.map(({ signal }) => signal)).toEqual([
      ...Array<null>(9).fill(null),
      'outside_high',
    ]);
    // Asked for its last week alone, it is judged by the same weeks.
    const alone = ask('overrun', '2026-01-05', '2026-01-11').branches[0]!;
    expect(alone.limits).toEqual(limits);
    expect(alone.weeks).toEqual(weeks.slice(-1));
  });

  it('given rot and product, tells the share of cars and the ratio to norm', async () => {
    await small.store.queue.write(() => {
      for (let car = 0; car < 5; car += 1) {
        const findings = car < 2 ? [found('floor')] : [];
        const products = [{ product: 'CW1', ml: 3000 + 500 * car }];
        small.write('AAA', `${car}`, carAged('2026-01-06', 3, { findings, products }));
      }
    });
    const valueOf = (measure: BranchMeasure) =>
      ask(measure, '2026-01-05', '2026-01-11').branches[0]!.weeks[0];
    expect(valueOf('rot')).toMatchObject({ cars: 5, value: 0.4 });
    expect(valueOf('product')).toMatchObject({ cars: 5, value: 1 });
  });

  it('given claims, counts those made in the week on cars of any day, and the cars under warranty then', async () => {
    await small.store.queue.write(() => {
      // Full cars are covered for 36 months: the first to the 6th of January 2026, a Tuesday.
      small.write('AAA', 'ending', carAged('2023-01-06', 3));
      small.write('AAA', 'older', carAged('2025-06-02', 3));
      small.write('AAA', 'new', carAged('2026-01-14', 3));
      small.write('AAA', 'bare', carAged('2025-06-02', 3, { package: 'bare' }));
      writeClaim(small, 'AAA', 'last-day', openClaim('ending', '2026-01-06'));
      writeClaim(small, 'AAA', 'too-late', openClaim('ending', '2026-01-07'));
      writeClaim(small, 'AAA', 'one', openClaim('older', '2026-01-13'));
      writeClaim(small, 'AAA', 'two', openClaim('older', '2026-01-18'));
      writeClaim(small, 'AAA', 'none', openClaim('bare', '2026-01-13'));
      const refused = { decision: 'refused', decidedOn: '2026-01-20' } as const;
      writeClaim(small, 'AAA', 'refused', openClaim('older', '2026-01-14', refused));
    });
    const told = ask('claims', '2026-01-05', '2026-02-01', { today: '2026-01-21' });
    expect(told.jobs).toBe(1);
    expect(told.branches).toEqual([
      {
        branch: 'AAA',
        limits: null,
        target: null,
        weeks: [
          { week: '2026-W02', cars: 2, value: 1, signal: null },
          { week: '2026-W03', cars: 2, value: 2, signal: null },
          { week: '2026-W04', cars: 2, value: 0, signal: null },
          // Not come yet.
          { week: '2026-W05', cars: 0, value: null, signal: null },
        ],
      },
    ]);
  });
});
