import { claimStanding, isOpenOn, type StandingClaim } from './claim-standing';

const END = '2026-03-15';
const claim: StandingClaim = {
  madeOn: '2025-06-01',
  decision: 'accepted',
  decidedOn: '2025-06-20',
};

describe('claimStanding', () => {
  it.each([
    ['accepted', claim, '2026-01-01', 'counted'],
    [
      'open',
      { madeOn: '2025-06-01', decision: 'open', decidedOn: null } as const,
      '2026-01-01',
      'counted',
    ],
    ['made on the as-of day', claim, '2025-06-01', 'counted'],
    ['made after the as-of day', claim, '2025-05-31', 'not_yet'],
    ['made on the last day of cover', { ...claim, madeOn: END }, '2026-12-01', 'counted'],
    ['made a day after cover', { ...claim, madeOn: '2026-03-16' }, '2026-12-01', 'after_end'],
    ['refused', { ...claim, decision: 'refused' } as const, '2026-01-01', 'refused'],
    [
      'refused on the as-of day',
      { ...claim, decision: 'refused' } as const,
      '2025-06-20',
      'refused',
    ],
    [
      'refused after the as-of day',
      { ...claim, decision: 'refused' } as const,
      '2025-06-19',
      'counted',
    ],
    [
      'refused without a day',
      { ...claim, decision: 'refused', decidedOn: null } as const,
      '2025-06-01',
      'refused',
    ],
  ] as const)('given a claim %s, says so (rule 14)', (_circumstance, one, asOf, standing) => {
    expect(claimStanding(one, END, asOf)).toBe(standing);
  });

  it('given a car without a warranty, counts none', () => {
    expect(claimStanding(claim, undefined, '2026-01-01')).toBe('after_end');
  });
});

describe('isOpenOn', () => {
  it('given a claim decided later, is open until that day', () => {
    expect(isOpenOn(claim, '2025-06-19')).toBe(true);
    expect(isOpenOn(claim, '2025-06-20')).toBe(false);
  });

  it('given an open claim, is open', () => {
    expect(isOpenOn({ ...claim, decision: 'open', decidedOn: null }, '2030-01-01')).toBe(true);
  });
});
