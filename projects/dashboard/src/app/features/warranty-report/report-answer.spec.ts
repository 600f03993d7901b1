import { warrantyBranch, warrantyReport } from '../../testing/warranty-report-answers';
import {
  branchesSentence,
  plainWords,
  rateSentence,
  reportSentence,
  secondSentence,
} from './report-answer';
import { formatDate } from '../../ui/format';

const DAY = formatDate('2026-02-01');
const EVALUATED = formatDate('2025-12-31');

const above = (branch: string) => warrantyBranch({ branch, lower: 1.1, upper: 2, ratio: 1.5 });

describe('reportSentence', () => {
  it('an estimate with its error, says the day, the figure no finer than its interval, and the cars', () => {
    expect(plainWords(reportSentence(warrantyReport()))).toBe(
      `Warranties sold by ${DAY} will still cost about €5,000, give or take 1,400 (2,300 cars).`,
    );
  });

  it('without an error, gives the figure and says that its interval cannot be said', () => {
    const total = {
      latestCents: 100,
      ultimateCents: 500,
      outstandingCents: 400,
      standardErrorCents: null,
    };
    expect(plainWords(reportSentence(warrantyReport({}, { total })))).toContain(
      'about €4; how sure that is cannot be said yet (2,300 cars).',
    );
  });

  it('nothing paid yet, says why there is no figure', () => {
    const total = {
      latestCents: 0,
      ultimateCents: 0,
      outstandingCents: 0,
      standardErrorCents: null,
    };
    expect(plainWords(reportSentence(warrantyReport({}, { total })))).toContain(
      `no claim was paid by ${EVALUATED}`,
    );
  });

  it('no car under warranty, says only that', () => {
    expect(plainWords(reportSentence(warrantyReport({}, { covered: 0 })))).toBe(
      `No car had been finished with a warranty by ${DAY}.`,
    );
  });
});

describe('secondSentence', () => {
  it('an interval wider than its figure, says so before the branches', () => {
    const report = warrantyReport();
    expect(secondSentence(report)).toBe(branchesSentence(report));
    const total = { ...report.answer.total, standardErrorCents: 10_000_000 };
    expect(secondSentence(warrantyReport({}, { total }))).toMatch(
      /^It can hardly be told yet, most of all for cars finished in 20\d\d H[12]: .* is paid\. Tangmoor has/,
    );
  });
});

describe('branchesSentence', () => {
  it('one branch outside, names it with its claims and counts the others', () => {
    expect(branchesSentence(warrantyReport())).toBe(
      'Tangmoor has 66 claims where 40 were expected; the other 2 branches are as expected.',
    );
  });

  it('many outside, names four of a side and counts the others', () => {
    const branches = ['A', 'B', 'C', 'D', 'E'].map((code) => above(code));
    const low = warrantyBranch({ branch: 'F', lower: 0.2, upper: 0.6 });
    expect(branchesSentence(warrantyReport({}, { branches: [...branches, low] }))).toBe(
      'A has 31 claims where 36 were expected, B 31 where 36 were, C 31 where 36 were, D 31 where 36 were, F 31 where 36 were, 1 more stands above.',
    );
  });

  it('none outside, says that all are as expected', () => {
    expect(branchesSentence(warrantyReport({}, { branches: [warrantyBranch()] }))).toBe(
      'The one branch is as expected.',
    );
  });

  it('nothing was expected anywhere, says nothing', () => {
    const branches = [warrantyBranch({ ratio: null, lower: null, upper: null })];
    expect(branchesSentence(warrantyReport({}, { branches }))).toBe('');
  });
});

describe('rateSentence', () => {
  it('with cover, gives the rate with its interval and what was paid', () => {
    expect(rateSentence(warrantyReport())).toBe(
      `118 claims in 6,800 car-years of cover: 17.4 per 1,000 (95 % interval 14.4–20.8). €14,001 was paid by ${EVALUATED}.`,
    );
  });

  it('without cover, gives no rate', () => {
    const rate = { claims: 0, carYears: 0, per1000: null, lower: null, upper: null };
    expect(rateSentence(warrantyReport({}, { rate }))).toBe(`€14,001 was paid by ${EVALUATED}.`);
  });
});
