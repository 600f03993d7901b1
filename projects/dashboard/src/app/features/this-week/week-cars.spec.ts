import { jobRow, jobsAnswer, marginAnswer, marginWeek } from '../../testing/week-answers';
import {
  differenceOf,
  largestStepText,
  tellingFirst,
  weekCarColumns,
  weekCarsNote,
} from './week-cars';
import { standingOf, type WeekAnswers } from './week-standing';
import type { WeekWords } from './week-words';

const words: WeekWords = {
  currency: 'EUR',
  today: '2026-02-02',
  branchName: (code) => `Branch ${code}`,
  packageName: () => 'Full',
  productName: (code) => code,
  whose: '',
};

function answers(more: Parameters<typeof marginAnswer>[1] = {}): WeekAnswers {
  const answer = marginAnswer([marginWeek('2026-W05')], more);
  return {
    chart: answer,
    week: answer,
    billed: jobsAnswer([jobRow('0417')]),
    unbilled: jobsAnswer([]),
  };
}

function cells(given: WeekAnswers, row = jobRow('0417')) {
  const columns = weekCarColumns(given, standingOf(given, words.today), words);
  return {
    labels: columns.map(({ label }) => label),
    row: Object.fromEntries(
      columns.map(({ key, text }) => [key, text(row).replaceAll('\u202f', ' ')]),
    ),
    total: Object.fromEntries(
      columns.map(({ key, total }) => [key, total?.replaceAll('\u202f', ' ')]),
    ),
    columns,
  };
}

describe('weekCarColumns', () => {
  it('a car: its figures in whole money, its job as a link, its package as a trade word', () => {
    const { row, columns } = cells(answers());
    expect(row).toMatchObject({
      ...{ job: '0417', car: 'Velder Tessock', package: 'full', billed: '850', expected: '379' },
      ...{ kept: '83', share: '10 %', difference: '−296', step: 'rot labour −186' },
    });
    expect(columns[0]!.link!(jobRow('0417'))).toEqual({ commands: ['/jobs', 'HAV', '0417'] });
  });

  it('the total row: counted from the cents of the week, not from the rounded rows', () => {
    expect(cells(answers()).total).toMatchObject({
      ...{
        job: '11 cars',
        billed: '8,925',
        expected: '4,218',
        kept: '3,237',
        share: '36 %',
        difference: '−981',
      },
    });
  });

  it('several branches: the branch has a column', () => {
    const wide = answers({ scope: { regions: ['OC'], branches: ['HAV', 'OST'] } });
    expect(cells(wide).labels).toContain('Branch');
    expect(cells(answers()).labels).not.toContain('Branch');
  });

  it('a car without costs: its money stays empty and its step says why', () => {
    const row = jobRow('1', {
      marginCents: null,
      marginShare: null,
      expectedMarginCents: null,
      largestStep: null,
    });
    expect(cells(answers(), row).row).toMatchObject({
      kept: '',
      share: '',
      difference: '',
      step: 'cost missing',
    });
  });

  it('no car in the bridge: no expected and no difference in the total', () => {
    const bridge = { ...marginAnswer([]).bridge, cars: 0 };
    expect(cells(answers({ bridge })).total).toMatchObject({ expected: '', difference: '' });
  });
});

describe('largestStepText', () => {
  it('a difference within 2 % of the bill: as planned', () => {
    const row = jobRow('1', { marginCents: 37_900 - 1_700, revenueCents: 85_000 });
    expect(largestStepText(row)).toBe('as planned');
    expect(largestStepText({ ...row, marginCents: 37_900 - 1_701 })).toBe('rot labour −186');
  });

  it('nothing to compare with: the reason', () => {
    const none = { expectedMarginCents: null, largestStep: null };
    expect(largestStepText(jobRow('1', { ...none, estimatedMinutes: null }))).toBe('no estimate');
    expect(largestStepText(jobRow('1', none))).toBe('no norm');
  });
});

describe('differenceOf', () => {
  it('kept minus expected in cents, null without either', () => {
    expect(differenceOf(jobRow('1'))).toBe(8_300 - 37_900);
    expect(differenceOf(jobRow('1', { expectedMarginCents: null }))).toBeNull();
  });
});

describe('tellingFirst', () => {
  it('a phone: job, car and difference come before the rest, none is lost', () => {
    const { columns } = cells(answers());
    const keys = tellingFirst(columns).map(({ key }) => key);
    expect(keys.slice(0, 3)).toEqual(['job', 'car', 'difference']);
    expect([...keys].sort()).toEqual(columns.map(({ key }) => key).sort());
  });
});

describe('weekCarsNote', () => {
  it('all cars comparable: the basis alone; else whose expectation it is', () => {
    const all = answers();
    expect(weekCarsNote(all, standingOf(all, words.today), '€')).toBe(
      '€ before tax, rounded; the total is of the cents',
    );
    const part = answers({ bridge: { ...marginAnswer([]).bridge, cars: 9 } });
    expect(weekCarsNote(part, standingOf(part, words.today), '€')).toContain(
      'expected and difference of the 9 cars with an estimate and a norm',
    );
  });
});
