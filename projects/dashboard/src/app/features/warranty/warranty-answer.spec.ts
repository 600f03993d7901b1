import type { AnswerPart } from '../../ui/answer/answer';
import {
  branchWarrantyAnswer,
  noWarranty,
  warrantyAnswer,
  warrantyBranch,
  warrantyCohort,
} from '../../testing/warranty-answers';
import { answerWarranty } from './warranty-answer';
import { warrantyLinks } from './warranty-links';

const NAMES: Readonly<Record<string, string>> = {
  HAV: 'Havnsund',
  TAN: 'Tangvarp',
  ULV: 'Ulvmark',
};
const words = {
  currency: 'EUR',
  branchName: (code: string) => NAMES[code] ?? code,
  regionName: (code: string) => code,
  packageWord: (code: string) => code,
};
const links = warrantyLinks({ asOf: '2026-02-01' }, { from: '2024-01-08', to: '2026-02-02' });

function say(answer = warrantyAnswer()) {
  const { sentence, second } = answerWarranty(answer, words, links);
  return { first: plain(sentence), second: plain(second), parts: second };
}
function plain(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');
}

describe('answerWarranty', () => {
  it('a network: what is still to come, as finely as it is known, and who stands outside, by name', () => {
    const { first, second } = say();
    expect(first).toBe(
      'Warranties already sold will still cost about €77,000, give or take 14,000 (4,320 cars).',
    );
    expect(second).toBe(
      'Tangvarp has 66 claims where 40 were expected, Ulvmark 21 where 34 were; the other branch is as expected.',
    );
  });

  it('claims of a branch outside: lead to the claims that count as of that day', () => {
    const [link] = say().parts.filter((part) => typeof part === 'object' && 'link' in part);
    expect(link).toEqual({
      text: '66 claims',
      link: '/claims',
      query: { asOf: '2026-02-01', counted: 'true', branch: 'TAN', region: undefined },
    });
  });

  it('three outside: the last one after "and"', () => {
    const out = { claims: 30, expected: 10, ratio: 3, lower: 2, upper: 4.3 };
    const branches = ['HAV', 'TAN', 'ULV'].map((code) => warrantyBranch(code, out));
    expect(say(warrantyAnswer({ branches })).second).toBe(
      'Havnsund has 30 claims where 10 were expected, Tangvarp 30 where 10 were and Ulvmark 30 where 10 were; none is as expected.',
    );
  });

  it('many outside: those above at length, those below in brief', () => {
    const above = { claims: 30, expected: 10, ratio: 3, lower: 2, upper: 4.3 };
    const below = { claims: 3, expected: 10, ratio: 0.3, lower: 0.1, upper: 0.9 };
    const branches = [
      warrantyBranch('HAV', below),
      warrantyBranch('KOR'),
      warrantyBranch('TAN', above),
      warrantyBranch('TOR', below),
      warrantyBranch('ULV', below),
    ];
    expect(say(warrantyAnswer({ branches })).second).toBe(
      'Tangvarp has 30 claims where 10 were expected; Havnsund (3 of 10), TOR (3 of 10) and Ulvmark (3 of 10) have fewer than expected; the other branch is as expected.',
    );
  });

  it('an interval wider than the sum: says for which cars it cannot be told yet', () => {
    const answer = warrantyAnswer();
    const total = { ...answer.total, standardErrorCents: 4_000_000 };
    expect(say({ ...answer, total }).second).toMatch(
      /^It can hardly be told yet, most of all for cars finished in 2025 H2: .* only €1,000 is paid\. Tangvarp/,
    );
  });

  it('none outside: says so of all', () => {
    const branches = [warrantyBranch('HAV'), warrantyBranch('TAN')];
    expect(say(warrantyAnswer({ branches })).second).toBe(
      'All 2 branches have about as many claims as expected.',
    );
  });

  it('one branch against the network: its own figures, nobody else’s', () => {
    const { second } = say(branchWarrantyAnswer());
    expect(second).toBe(
      'Havnsund has 49 claims where the whole network’s rates lead one to expect 46: as expected (0.8–1.4 times).',
    );
  });

  it('one branch and too few others: nothing to expect by', () => {
    expect(say(branchWarrantyAnswer({ reference: 'scope' })).second).toContain(
      'Fewer than five other branches',
    );
  });

  it('three half-years: a sum without give or take, and why', () => {
    const answer = warrantyAnswer();
    const { first, second } = say({
      ...answer,
      cohorts: answer.cohorts.slice(0, 3),
      total: { ...answer.total, standardErrorCents: null },
    });
    expect(first).toBe('Warranties already sold will still cost about €77,000 (4,320 cars).');
    expect(second).toContain('it needs cars of four half-years, and there are 3.');
  });

  it('one half-year: no sum, and what it takes', () => {
    const { first, second } = say(warrantyAnswer({ cohorts: [warrantyCohort()] }));
    expect(first).toContain('cannot be said yet');
    expect(second).toContain('there is one up to');
  });

  it('claims that nothing was paid on: no sum', () => {
    const total = {
      latestCents: 0,
      ultimateCents: 0,
      outstandingCents: 0,
      standardErrorCents: null,
    };
    const { first, second } = say(warrantyAnswer({ total }));
    expect(first).toContain('cannot be said yet');
    expect(second).toContain('Nothing was paid on a claim');
  });

  it('no claim: how many cars, how much cover, and where a claim is recorded', () => {
    const { first, second } = say(
      noWarranty({
        jobs: 40,
        covered: 40,
        rate: { claims: 0, carYears: 31.4, per1000: 0, lower: 0, upper: 117.5 },
      }),
    );
    expect(first).toBe('No claim was made on 40 cars under warranty.');
    expect(second).toContain('31 car-years');
    expect(second).toContain('117.5');
    expect(second).toContain('job sheet');
  });

  it('no warranty sold: says where it is set', () => {
    const { first, second } = say(noWarranty({ jobs: 40 }));
    expect(first).toBe('No warranty was sold with these 40 cars.');
    expect(second).toContain('Set-up');
  });

  it('no car: what to choose', () => {
    expect(say(noWarranty()).first).toBe('No car was finished in this time.');
  });
});
