import type { MarginAnswer } from '#shared/contracts/margin';
import { addDays, isoWeek } from '#shared/domain/calendar';
import { keptJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { answerMargin } from './answer-margin';

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
});
afterEach(() => small.close());

const TODAY = '2026-03-04';

function ask(from: string, to: string, today = TODAY): MarginAnswer {
  const db = small.store.scoped(small.scope('AAA'));
  return answerMargin(db, { period: { from, to }, filters: {}, today });
}
/** One job a week from a Monday on, each on its Wednesday; null leaves the week empty. */
async function weekly(monday: string, shares: readonly (number | null)[]): Promise<void> {
  await small.store.queue.write(() => {
    shares.forEach((share, week) => {
      const on = addDays(monday, 7 * week + 2);
      if (share !== null) small.write('AAA', `w-${on}`, keptJob(on, share));
    });
  });
}
const signals = (answer: MarginAnswer) => answer.weeks.map((week) => week.signal);

describe('answerMargin, cut weeks (rule 7)', () => {
  it('given ends inside a week, shows only the days within and judges neither end', async () => {
    await weekly('2025-11-03', Array<number>(12).fill(0.4));
    await small.putJob('AAA', 'monday', keptJob('2026-01-19', 0.9));
    const answer = ask('2025-11-05', '2026-01-20');
    expect(answer.weeks[0]).toMatchObject({ week: '2025-W45', jobs: 1, whole: false });
    expect(answer.weeks.at(-1)).toMatchObject({
      week: '2026-W04',
      jobs: 1,
      marginShare: 0.9,
      whole: false,
      signal: null,
    });
    // Ten whole weeks, the last of them not in its own baseline; nothing of the two ends.
    expect(answer.limits).toMatchObject({ centre: 0.4, lower: 0.4, upper: 0.4, baselineWeeks: 9 });
    expect(answer.trend?.slopePerWeek).toBe(0);
  });

  it('given a week that is not over today, does not judge it', async () => {
    await weekly('2025-12-01', Array<number>(9).fill(0.4));
    await small.putJob('AAA', 'now', keptJob('2026-02-03', 0.9));
    const sunday = '2026-02-08';
    const before = ask('2025-12-01', sunday, sunday).weeks.at(-1);
    expect(before).toMatchObject({ week: '2026-W06', whole: false, signal: null });
    const after = ask('2025-12-01', sunday, '2026-02-09').weeks.at(-1);
    expect(after).toMatchObject({ whole: true, signal: 'outside_high' });
  });
});

describe('answerMargin, limits and signals (rules 5 and 6)', () => {
  it('given a series worked out by hand, has its centre, limits and signals', async () => {
    // Mean of the first nine: 3.6 / 9 = 0.4. Ranges .02 .04 .02 .02 .04 .06 .04 .04, mean 0.28 / 8 = 0.035.
    const shares = [0.4, 0.42, 0.38, 0.4, 0.42, 0.38, 0.44, 0.4, 0.36, 0.48];
    await weekly('2025-11-03', shares);
    const answer = ask('2025-11-03', '2026-01-11');
    expect(answer.limits?.baselineWeeks).toBe(9);
    // 3 / 1.128 × 0.035 = 0.0930851063…
    expect(answer.limits?.centre).toBeCloseTo(0.4, 12);
    expect(answer.limits?.lower).toBeCloseTo(0.4 - 0.0930851064, 10);
    expect(answer.limits?.upper).toBeCloseTo(0.4 + 0.0930851064, 10);
    expect(signals(answer)).toEqual(Array(10).fill(null));
    await small.putJob('AAA', `w-2026-01-07`, keptJob('2026-01-07', 0.494));
    expect(signals(ask('2025-11-03', '2026-01-11')).at(-1)).toBe('outside_high');
    // The last week is judged by limits it has no part in.
    expect(ask('2025-11-03', '2026-01-11').limits).toEqual(answer.limits);
  });

  it('given seven weeks before the last, has no limits; given eight, has them', async () => {
    await weekly('2025-11-03', [0.4, 0.41, 0.4, 0.41, 0.4, 0.41, 0.4, 0.9]);
    const few = ask('2025-11-03', '2025-12-28');
    expect(few.limits).toBeNull();
    expect(signals(few)).toEqual(Array(8).fill(null));
    expect(few.trend).not.toBeNull();
    await weekly('2025-12-29', [0.4]);
    expect(ask('2025-11-03', '2026-01-04').limits?.baselineWeeks).toBe(8);
    expect(ask('2025-11-10', '2025-12-28').trend).toBeNull();
  });

  it('given gaps, takes consecutive billed weeks; the trend counts the weeks between', async () => {
    await weekly('2025-10-06', [
      0.4,
      null,
      0.41,
      0.4,
      null,
      null,
      0.41,
      0.4,
      0.41,
      0.4,
      0.41,
      0.44,
    ]);
    const answer = ask('2025-10-06', '2025-12-28');
    expect(answer.limits?.baselineWeeks).toBe(8);
    // Seven moves of 0.01 each.
    const reach = (3 / 1.128) * 0.01;
    expect(answer.limits?.upper).toBeCloseTo(0.405 + reach, 12);
    expect(signals(answer)).toEqual([...Array<null>(11).fill(null), 'outside_high']);
    const straight = [0.3, null, 0.32, 0.33, null, 0.35, 0.36, 0.37, 0.38, 0.39];
    await weekly('2024-10-07', straight);
    const risen = ask('2024-10-07', '2024-12-15').trend;
    expect(risen?.slopePerWeek).toBeCloseTo(0.01, 12);
    expect(risen?.p).toBeLessThan(0.01);
  });

  it('given a short period, takes the weeks before it, up to 26, whole', async () => {
    await weekly('2025-06-02', [...Array<number>(30).fill(0.4), 0.7]);
    const week = ask('2025-12-29', '2026-01-04');
    expect(week.weeks).toHaveLength(1);
    expect(week.limits).toMatchObject({ centre: 0.4, baselineWeeks: 26 });
    expect(signals(week)).toEqual(['outside_high']);
    // Cut in the middle of its first week: that week is neither shown whole nor in the baseline.
    const cut = ask('2025-12-24', '2026-01-04');
    expect(cut.weeks.map(({ whole }) => whole)).toEqual([false, true]);
    expect(cut.limits).toMatchObject({ centre: 0.4, baselineWeeks: 26 });
  });

  it('given a branch that bills seldom, looks as far back as it must for its baseline', async () => {
    const on = (index: number) => addDays('2021-01-06', 7 * 9 * index);
    for (let index = 0; index < 28; index += 1) {
      await small.putJob('AAA', `r-${index}`, keptJob(on(index), index < 2 ? 0.9 : 0.4));
    }
    const last = on(27);
    const answer = ask(addDays(last, -2), addDays(last, 4));
    expect(answer.weeks[0]?.week).toBe(isoWeek(last));
    // Weeks 1 … 26 of 0 … 27: one of the two early ones lies beyond the 26.
    expect(answer.limits?.baselineWeeks).toBe(26);
    expect(answer.limits?.centre).toBeCloseTo((0.9 + 25 * 0.4) / 26, 12);
  });

  it('given eight weeks on one side, flags the run from its eighth week on, counted from the start of the period', async () => {
    const before = Array.from({ length: 19 }, (_, week) => (week % 2 === 0 ? 0.3 : 0.5));
    await weekly('2025-05-05', [...before, ...Array<number>(10).fill(0.42)]);
    const whole = ask('2025-05-05', '2025-11-23');
    expect(whole.limits?.centre).toBeLessThan(0.42);
    expect(signals(whole).slice(-4)).toEqual([null, 'run_high', 'run_high', 'run_high']);
    // The same weeks asked for from the third of the run: only eight are left, the last flagged.
    const later = ask('2025-09-29', '2025-11-23');
    expect(signals(later)).toEqual([...Array<null>(7).fill(null), 'run_high']);
  });

  it('given jobs of another branch and package, has neither in figures nor in limits', async () => {
    await weekly('2025-06-02', Array<number>(12).fill(0.4));
    const asked = () => {
      const db = small.store.scoped(small.scope('AAA'));
      const packageIds = [small.store.state.package('full')?.id ?? 0];
      const period = { from: '2025-08-11', to: '2025-08-24' };
      return answerMargin(db, { period, filters: { packageIds }, today: TODAY });
    };
    const before = JSON.stringify(asked());
    await small.putJob('BBB', 'other', keptJob('2025-07-02', 0.9));
    await small.putJob('AAA', 'cavity', { ...keptJob('2025-07-02', 0.9), package: 'cavity' });
    expect(JSON.stringify(asked())).toBe(before);
  });
});
