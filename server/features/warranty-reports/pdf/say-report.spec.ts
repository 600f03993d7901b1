import { sampleReport } from '../../../../test/support/sample-report';
import { signedMoney } from './format';
import { sayAnswer, sayBranches, standing } from './say-report';

const voice = {
  branch: (code: string) => `Branch ${code}`,
  money: (cents: number) => signedMoney(cents, 'EUR'),
};
const { answer } = sampleReport();
const said = (parts: object): string => Object.values(parts).join('');
const branch = (code: string, claims: number, expected: number, interval: [number, number]) => ({
  branch: code,
  cars: 100,
  carYears: 200,
  claims,
  expected,
  ratio: claims / expected,
  lower: interval[0],
  upper: interval[1],
});

describe('sayAnswer', () => {
  const total = { ...answer.total, outstandingCents: 7_656_100, standardErrorCents: 707_300 };

  it('given an error, says the cost to the digits that it supports', () => {
    expect(said(sayAnswer({ ...answer, covered: 23_050, total }, voice))).toBe(
      'Warranties already sold will still cost about €77,000, give or take 14,000 (23,050 cars).',
    );
  });

  it('given no error, says that too few half-years stand behind it', () => {
    const without = { ...total, standardErrorCents: null };
    expect(said(sayAnswer({ ...answer, covered: 1, total: without }, voice))).toBe(
      'Warranties already sold will still cost about €77,000; too few half-years stand behind it to say give or take (1 car).',
    );
  });

  it('given no half-year to carry forward by, gives no figure', () => {
    const triangle = { rows: [], factors: [] };
    expect(said(sayAnswer({ covered: 12, total, triangle }, voice))).toBe(
      'What warranties already sold will still cost cannot be said: too few half-years stand behind it (12 cars).',
    );
  });

  it('given no car with a warranty, says so', () => {
    expect(said(sayAnswer({ ...answer, covered: 0 }, voice))).toMatch(/^No car had been sold/);
  });
});

describe('sayBranches', () => {
  it('given branches outside, names them with their counts and counts the others', () => {
    const branches = [
      branch('A', 66, 40, [1.28, 2.1]),
      branch('B', 21, 34, [0.38, 0.94]),
      branch('C', 10, 10.2, [0.5, 1.8]),
      branch('D', 11, 10.2, [0.5, 1.8]),
    ];
    expect(sayBranches(branches, voice)).toBe(
      'Branch A has 66 claims where 40 were expected, Branch B 21 where 34 were; the other 2 branches are as expected.',
    );
  });

  it('given more than four above, counts the rest', () => {
    const many = Array.from({ length: 6 }, (_, index) => branch(`B${index}`, 9, 3, [1.4, 5.7]));
    expect(sayBranches(many, voice)).toMatch(/, 2 more stand above\.$/);
  });

  it('given none outside, or nobody with claims expected, says that', () => {
    expect(sayBranches([branch('A', 3, 3, [0.2, 2.9])], voice)).toContain('is as expected');
    expect(sayBranches([], voice)).toContain('no claims yet');
  });
});

describe('standing', () => {
  it('given an interval that touches 1, is as expected', () => {
    expect(standing({ ratio: 1.4, lower: 1, upper: 2 })).toBe('as expected');
    expect(standing({ ratio: null, lower: null, upper: null })).toBeNull();
  });
});
