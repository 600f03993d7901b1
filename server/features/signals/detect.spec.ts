import { addDays } from '#shared/domain/calendar';
import { tellSignal } from '#shared/domain/tell-signal';
import { detectComeBacksDue } from './detect-come-backs-due';
import { detectLeftFunnel, type Placement } from './detect-left-funnel';
import { detectOddValues, type CheckedCar } from './detect-odd-values';
import { detectSilence } from './detect-silence';
import { detectUnbilled } from './detect-unbilled';

/** Every Monday to Friday from a Monday on. */
function workDays(monday: string, weeks: number): string[] {
  return Array.from({ length: 5 * weeks }, (_, n) =>
    addDays(monday, 7 * Math.floor(n / 5) + (n % 5)),
  );
}

describe('detectSilence', () => {
  // 2026-01-30 is the Friday of the fifth week.
  const days = workDays('2025-12-29', 5);
  const ask = (today: string, over: object = {}) =>
    detectSilence({ branchId: 1, today, closed: false, days, ...over });

  it('given a week without a job, tells of it on the first day after five of its own days, weekends not counted', () => {
    expect(ask('2026-02-07')).toEqual([]);
    expect(ask('2026-02-09')).toEqual([]);
    const [found] = ask('2026-02-10');
    expect(found).toMatchObject({
      since: '2026-01-31',
      facts: { lastReceivedOn: '2026-01-30', quietDays: 6, usualDays: 5 },
    });
  });

  it('given a longer gap before, allows for as long a one again', () => {
    const gap = workDays('2025-11-17', 4).concat(days);
    expect(
      ask('2026-02-10', { days: gap.filter((day) => day < '2025-12-01' || day > '2025-12-12') }),
    ).toEqual([]);
  });

  it('given a closed branch, or too few days to have a habit, says nothing', () => {
    expect(ask('2026-03-30', { closed: true })).toEqual([]);
    expect(ask('2026-03-30', { days: days.slice(0, 19) })).toEqual([]);
  });
});

describe('detectUnbilled', () => {
  it('given cars that wait 14 and 15 days, tells of the second with its cost', () => {
    const cars = [
      { ref: 'a', completedOn: '2026-01-18', costCents: 40_000 },
      { ref: 'b', completedOn: '2026-01-19', costCents: 50_000 },
    ];
    const [found] = detectUnbilled({ branchId: 1, today: '2026-02-02', currency: 'EUR', cars });
    expect(found).toMatchObject({
      cars: 1,
      listed: [{ ref: 'a', why: 'waits 15 days' }],
      facts: { oldestDays: 15, costCents: 40_000, withoutCost: 0 },
    });
    expect(tellSignal(found!, 'Aname').sentence).toContain('1 finished car without a bill');
  });
});

describe('detectComeBacksDue', () => {
  const finding = (ref: string, dueOn: string, ownerToldOn: string | null = null) => ({
    ...{ ref, dueOn, ownerToldOn },
  });

  it('given a danger due today and one due yesterday, tells of yesterday’s, and that the owner must be told', () => {
    const findings = [finding('a', '2026-02-01'), finding('b', '2026-02-02')];
    const [found] = detectComeBacksDue({ branchId: 1, today: '2026-02-02', findings });
    expect(found).toMatchObject({ cars: 1, strength: 1, facts: { notTold: 1 } });
    expect(tellSignal(found!, 'Aname').sentence).toContain('must be told in writing');
  });
});

describe('detectOddValues', () => {
  const plain: CheckedCar = {
    ...{ ref: 'a', completedOn: '2026-01-05', longestStage: 1199, mostMl: 39_999 },
    ...{ zeroPrice: false, zeroBill: false },
  };
  const copies = (count: number) =>
    Array.from({ length: count }, (_, n) => ({
      ...{ ref: `c${n}`, completedOn: '2026-01-20', copied: true },
    }));

  it('given values just within reason, says nothing; at the limit, says why of each car', () => {
    expect(detectOddValues({ branchId: 1, odd: [plain], timed: copies(19) })).toEqual([]);
    const odd = [{ ...plain, longestStage: 1200, mostMl: 40_000, zeroBill: true }];
    expect(detectOddValues({ branchId: 1, odd, timed: [] })[0]?.listed).toEqual([
      {
        ref: 'a',
        why: 'a stage of 20 hours; 40 litres of one product; a bill of nothing',
      },
    ]);
  });

  it('given twenty copies in a row up to the newest, lists them; given one real car after them, does not', () => {
    expect(detectOddValues({ branchId: 1, odd: [], timed: copies(20) })[0]?.cars).toBe(20);
    const timed = [{ ref: 'real', completedOn: '2026-01-21', copied: false }, ...copies(20)];
    expect(detectOddValues({ branchId: 1, odd: [], timed })).toEqual([]);
  });
});

describe('detectLeftFunnel', () => {
  const place = (flag: Placement['flag']): Placement => ({
    ...{ branchId: 1, measure: 'rot', cars: 100, value: 0.5, expected: 0.3 },
    ...{ lower998: 0.2, upper998: 0.4, flag, from: '2025-02-03', to: '2026-02-02' },
  });

  it('given 99.8 % limits left, opens; given only the 95 % ones, keeps; within them, nothing', () => {
    const weights = (['above_998', 'above_95', 'as_expected', 'too_few'] as const).map(
      (flag) => detectLeftFunnel(place(flag), [1, 2], '2026-02-02')[0]?.weight,
    );
    expect(weights).toEqual(['open', 'keep', undefined, undefined]);
    const [found] = detectLeftFunnel(place('above_998'), [1, 2], '2026-02-02');
    expect(found?.strength).toBeCloseTo(2, 12);
    expect(found).toMatchObject({ key: 'rot high', behind: [1, 2] });
  });
});
