import type { AnswerPart } from '../../ui/answer/answer';
import {
  jobRow,
  jobsAnswer,
  marginAnswer,
  marginWeek,
  unbilledRow,
  weeksFromTo,
} from '../../testing/week-answers';
import { formatDate } from '../../ui/format';
import { answerWeek } from './week-answer';
import { standingOf, type WeekAnswers } from './week-standing';
import type { WeekWords } from './week-words';

const words: WeekWords = {
  currency: 'EUR',
  today: '2026-02-02',
  branchName: (code) => (code === 'HAV' ? 'Havnsund' : code),
  packageName: (code) => code,
  productName: (code) => code,
  whose: 'this branch’s',
};

interface Case {
  readonly week?: Parameters<typeof marginWeek>[1];
  readonly more?: Parameters<typeof marginAnswer>[1];
  readonly unbilled?: number;
  readonly today?: string;
  readonly billed?: ReturnType<typeof jobRow>[];
  readonly before?: Parameters<typeof weeksFromTo>[2];
}

/** Both sentences of a case as plain text, narrow spaces as spaces. */
function say({
  week,
  more,
  unbilled = 0,
  today = words.today,
  billed = [jobRow('1')],
  before,
}: Case) {
  const weeks = weeksFromTo('2025-W31', '2026-W05', before);
  weeks[weeks.length - 1] = marginWeek('2026-W05', week);
  const answers: WeekAnswers = {
    chart: marginAnswer(weeks, more),
    week: marginAnswer([weeks.at(-1)!], more),
    billed: jobsAnswer(billed),
    unbilled: jobsAnswer(Array.from({ length: unbilled }, (_, i) => unbilledRow(String(i), i))),
  };
  const { sentence, second } = answerWeek(answers, standingOf(answers, today), { ...words, today });
  return { first: text(sentence), second: text(second), figure: sentence.find(isFigure)?.figure };
}

function text(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      return 'figure' in part ? part.figure : 'quiet' in part ? part.quiet : part.text;
    })
    .join('')
    .replaceAll('\u202f', ' ');
}

function isFigure(part: AnswerPart): part is { figure: string } {
  return typeof part !== 'string' && 'figure' in part;
}

describe('answerWeek', () => {
  it('an ordinary week: share, cars and usual range in one sentence, the largest step and unbilled cars in the next', () => {
    const { first, second, figure } = say({ week: { jobs: 15, unbilled: 4 }, unbilled: 4 });
    expect(first).toBe(
      'Week 5 kept 36 % of what it billed (11 cars), inside this branch’s usual 31–46 %.',
    );
    expect(second).toBe(
      'Rot labour took 8 points (€735). Four more cars are finished and not yet billed.',
    );
    expect(figure).toBe('36\u202f%');
  });

  it('below a limit: says below', () => {
    const { first } = say({ week: { marginShare: 0.29, signal: 'outside_low' } });
    expect(first).toContain('kept 29 %');
    expect(first).toContain(', below this branch’s usual 31–46 %.');
  });

  it('above a limit by less than a point: one decimal, so that it does not contradict itself', () => {
    const { first } = say({ week: { marginShare: 0.4641, signal: 'outside_high' } });
    expect(first).toBe(
      'Week 5 kept 46.4 % of what it billed (11 cars), above this branch’s usual 30.9–46.4 %.',
    );
  });

  it('a run: inside, but which week running', () => {
    const { first } = say({
      week: { marginShare: 0.36, signal: 'run_low' },
      before: (week, index) => marginWeek(week, { marginShare: index < 18 ? 0.4 : 0.36 }),
    });
    expect(first).toContain(
      ', inside this branch’s usual 31–46 %, but the 9th week running below the centre of 39 %.',
    );
  });

  it('no limits yet: says when there will be', () => {
    const { first, second } = say({ more: { limits: null } });
    expect(first).toBe('Week 5 kept 36 % of what it billed (11 cars).');
    expect(second).toContain('What is usual here can be said once 8 earlier weeks are billed.');
  });

  it('the running week: so far, and why it is not judged', () => {
    const { first, second } = say({ week: { whole: false, jobs: 3 }, today: '2026-01-30' });
    expect(first).toBe('Week 5 has kept 36 % of what it billed (3 cars) so far.');
    expect(second).toContain('The week is not over, so it is not judged yet.');
  });

  it('nothing billed but cars finished: how many, and to bill them', () => {
    const week = { jobs: 4, unbilled: 4, revenueCents: 0, marginCents: 0, marginShare: null };
    const { first, second } = say({ week, unbilled: 4 });
    expect(first).toBe('Week 5 finished 4 cars and has billed none of them yet.');
    expect(second).toBe('Bill them below, and the week has its margin.');
  });

  it('nothing billed, and earlier cars wait too: these are said as well', () => {
    const week = { jobs: 1, unbilled: 1, revenueCents: 0, marginCents: 0, marginShare: null };
    const { first, second } = say({ week, unbilled: 3 });
    expect(first).toBe('Week 5 finished 1 car and has not billed it yet.');
    expect(second).toContain('Two cars from earlier are finished and not yet billed.');
  });

  it('no cars: what to do', () => {
    const week = { jobs: 0, revenueCents: 0, marginCents: 0, marginShare: null };
    const { first, second } = say({ week });
    expect(first).toBe('No car was finished in week 5, 2026.');
    expect(second).toContain('Choose another week');
  });

  it('no cars, nor in any week before: does not send anybody there', () => {
    const { second } = say({
      week: { jobs: 0, revenueCents: 0, marginCents: 0, marginShare: null },
      before: (earlier) => marginWeek(earlier, { jobs: 0 }),
    });
    expect(second).toBe('Nor in the weeks before it, in what is chosen in the line above.');
  });

  it('a week ahead: it is still to come', () => {
    const week = { jobs: 0, revenueCents: 0, marginCents: 0, marginShare: null, whole: false };
    expect(say({ week, today: '2026-01-20' }).first).toBe('Week 5, 2026 is still to come.');
  });

  it('costs missing for every car: names what to set', () => {
    const { first, second } = say({
      week: { jobs: 1, revenueCents: 0, marginCents: 0, marginShare: null },
      more: {
        withoutCost: 1,
        missingCosts: [{ kind: 'hourlyCost', code: 'HAV', on: '2026-01-28' }],
      },
      billed: [jobRow('1', { marginCents: null, marginShare: null })],
    });
    expect(first).toBe('What week 5 kept cannot be said: a cost is missing.');
    expect(second).toContain(
      `Head office has to set the hourly cost of Havnsund from ${formatDate('2026-01-28')};`,
    );
  });

  it('a cost missing for one car: says it is left out and what to set', () => {
    const { first, second } = say({
      week: { jobs: 2 },
      more: { withoutCost: 1, missingCosts: [{ kind: 'product', code: 'CW1', on: '2026-01-28' }] },
      billed: [jobRow('1'), jobRow('2', { marginCents: null, marginShare: null })],
    });
    expect(first).toContain('(1 car)');
    expect(second).toContain(
      `One billed car is left out until head office sets the cost of CW1 from ${formatDate('2026-01-28')}.`,
    );
  });

  it('billed at nothing: no share of nothing', () => {
    const { first } = say({ week: { revenueCents: 0, marginShare: null } });
    expect(first).toBe('Week 5 billed €0 (11 cars), so no share of it can be kept.');
  });

  it('no car with estimate and norm: no bridge to explain it', () => {
    const bridge = { ...marginAnswer([]).bridge, cars: 0 };
    expect(say({ more: { bridge } }).second).toContain('there is no bridge to explain it');
  });

  it('a gain as the largest step: it added', () => {
    const bridge = { ...marginAnswer([]).bridge, priceCents: 90_000 };
    expect(say({ more: { bridge } }).second).toContain('Price added 10 points (€900).');
  });

  it('one point: in the singular', () => {
    const bridge = { ...marginAnswer([]).bridge, ...flat, rotLabourCents: -9_000 };
    expect(say({ more: { bridge } }).second).toContain('Rot labour took 1 point (€90).');
  });

  it('steps under half a point: none is named', () => {
    const bridge = { ...marginAnswer([]).bridge, ...flat, feeCents: -900 };
    expect(say({ more: { bridge } }).second).toBe('No step moved it by as much as a point.');
  });

  it('a loss: true minus', () => {
    expect(say({ week: { marginShare: -0.12, signal: 'outside_low' } }).first).toContain(
      'kept −12 %',
    );
  });
});

const flat = {
  priceCents: 0,
  plannedLabourCents: 0,
  rotLabourCents: 0,
  productCents: 0,
  consumablesCents: 0,
  feeCents: 0,
};
