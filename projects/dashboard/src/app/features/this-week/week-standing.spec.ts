import {
  jobRow,
  jobsAnswer,
  marginAnswer,
  marginWeek,
  weeksFromTo,
} from '../../testing/week-answers';
import { countRunning, standingOf, type WeekAnswers } from './week-standing';

const TODAY = '2026-02-02';

function answers(
  last: Parameters<typeof marginWeek>[1],
  more: Parameters<typeof marginAnswer>[1] = {},
  billed = [jobRow('0417')],
): WeekAnswers {
  const weeks = weeksFromTo('2025-W31', '2026-W05');
  weeks[weeks.length - 1] = marginWeek('2026-W05', last);
  return {
    chart: marginAnswer(weeks, more),
    week: marginAnswer([weeks.at(-1)!], more),
    billed: jobsAnswer(billed),
    unbilled: jobsAnswer([]),
  };
}

describe('standingOf', () => {
  it.each([
    ['inside', null],
    ['below', 'outside_low'],
    ['above', 'outside_high'],
    ['run_low', 'run_low'],
    ['run_high', 'run_high'],
  ] as const)('a judged week: %s', (kind, signal) => {
    expect(standingOf(answers({ signal }), TODAY).kind).toBe(kind);
  });

  it('cars behind the figure: billed ones only', () => {
    expect(standingOf(answers({ jobs: 15, unbilled: 4 }), TODAY).cars).toBe(11);
  });

  it('nothing finished: no cars when past, to come when ahead', () => {
    const none = { jobs: 0, revenueCents: 0, marginShare: null };
    expect(standingOf(answers(none), TODAY).kind).toBe('no_cars');
    expect(standingOf(answers(none), '2026-01-20').kind).toBe('to_come');
  });

  it('all unbilled: says so before anything else', () => {
    const week = { jobs: 4, unbilled: 4, revenueCents: 0, marginShare: null };
    expect(standingOf(answers(week), TODAY).kind).toBe('unbilled_only');
  });

  it('billed at nothing: no share', () => {
    expect(standingOf(answers({ revenueCents: 0, marginShare: null }), TODAY).kind).toBe(
      'billed_nothing',
    );
  });

  it('the running week: so far, not judged', () => {
    expect(standingOf(answers({ whole: false }), '2026-01-30').kind).toBe('so_far');
  });

  it('fewer than 8 earlier weeks: no limits', () => {
    expect(standingOf(answers({}, { limits: null }), TODAY).kind).toBe('no_limits');
  });

  it('one car without a cost: left out of those behind the figure', () => {
    const billed = [
      jobRow('1'),
      jobRow('2', { marginCents: null, marginShare: null }),
      jobRow('3'),
    ];
    const standing = standingOf(answers({ jobs: 3 }, { withoutCost: 1 }, billed), TODAY);
    expect(standing).toMatchObject({ kind: 'inside', cars: 2, leftOut: 1 });
  });

  it('every car without a cost: uncosted', () => {
    const billed = [jobRow('1', { marginCents: null, marginShare: null })];
    const week = { jobs: 1, revenueCents: 0, marginShare: null };
    expect(standingOf(answers(week, { withoutCost: 1 }, billed), TODAY).kind).toBe('uncosted');
  });

  it('an answer without the week: as no cars, not an error', () => {
    const given = answers({});
    const standing = standingOf({ ...given, chart: { ...given.chart, weeks: [] } }, TODAY);
    expect(standing.kind).toBe('no_cars');
  });
});

describe('countRunning', () => {
  const chart = (shares: readonly (number | null)[]) =>
    marginAnswer(
      weeksFromTo('2025-W40', '2026-W05')
        .slice(0, shares.length)
        .map((week, index) => ({ ...week, marginShare: shares[index]! })),
      { limits: { centre: 0.4, lower: 0.2, upper: 0.6, baselineWeeks: 26 } },
    );

  it('nine weeks below the centre: the ninth is the 9th', () => {
    const answer = chart([0.5, ...Array<number>(9).fill(0.3)]);
    expect(countRunning(answer, answer.weeks.at(-1)!.week)).toBe(9);
  });

  it('a week without bills between: skipped, the run goes on', () => {
    const answer = chart([0.3, 0.3, null, 0.3]);
    expect(countRunning(answer, answer.weeks.at(-1)!.week)).toBe(3);
  });

  it('a week on the centre: ends the run', () => {
    const answer = chart([0.3, 0.3, 0.4, 0.3]);
    expect(countRunning(answer, answer.weeks.at(-1)!.week)).toBe(1);
  });

  it('no limits: nothing runs', () => {
    expect(countRunning({ ...chart([0.3]), limits: null }, '2025-W40')).toBe(0);
  });
});
