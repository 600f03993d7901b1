import type { CoveredClaim } from '#db/queries/warranty';
import { claimWeeks } from './claim-weeks';

/** One car a branch, finished on the same day with a year of warranty, sold the same. */
const soldOn = (completedOn: string) => ({
  ...{ completedOn: [completedOn], warrantyMonths: [12] },
  ...{ packageIds: [1], bands: [3] },
});
const CARS = [
  { branchId: 2, ...soldOn('2025-01-01') },
  { branchId: 1, ...soldOn('2025-01-01') },
];
const claim = (over: Partial<CoveredClaim>): CoveredClaim & { ref: string } => ({
  ...{ branchId: 1, packageId: 1, band: 3, completedOn: '2025-01-01', warrantyMonths: 12 },
  ...{
    madeOn: '2025-06-10',
    decision: 'accepted',
    decidedOn: '2025-06-20',
    cause: 'thin_coverage',
  },
  ...{ ref: 'job', ...over },
});
/** Weeks up to the one of 9 June 2025, as seen much later: all cover has run. */
const ASKED = { end: '2025-06-16', weeks: 3, today: '2026-02-02' };

describe('claimWeeks', () => {
  it('given one claim in two years of cover, expects its rate a day, drawn towards its month', () => {
    const [first, second] = claimWeeks(CARS, [claim({})], ASKED);
    expect(first).toMatchObject({ branchId: 1, monday: '2025-05-26' });
    expect(first?.claims).toEqual([[], [], [{ ref: 'job', madeOn: '2025-06-10' }]]);
    expect(second).toMatchObject({ branchId: 2, claims: [[], [], []] });
    // 365 days of cover each, from the day after completion on; of both, 62 in May and 60 in June.
    const rate = 1 / 730;
    const may = 20 / (62 * rate + 20);
    const june = 21 / (60 * rate + 20);
    const expected = [(6 * may + 1 * june) * rate, 7 * june * rate, 7 * june * rate];
    for (const branch of [first, second]) {
      branch?.expected.forEach((value, week) => expect(value).toBeCloseTo(expected[week]!, 12));
    }
  });

  it('given claims that do not count, expects and tells none of them', () => {
    const none = [claim({ decision: 'refused' }), claim({ madeOn: '2026-01-02' })];
    const told = claimWeeks(CARS, none, ASKED);
    expect(told.flatMap(({ claims }) => claims.flat())).toEqual([]);
    expect(told.flatMap(({ expected }) => expected)).toEqual([0, 0, 0, 0, 0, 0]);
  });

  it('given weeks after the end of all cover, expects nothing in them', () => {
    const [first] = claimWeeks(CARS, [claim({})], { ...ASKED, end: '2026-01-12', weeks: 2 });
    expect(first?.monday).toBe('2025-12-29');
    expect(first?.expected[0]).toBeGreaterThan(0);
    expect(first?.expected[1]).toBeCloseTo(0, 12);
  });

  it('given a branch without any car under warranty, leaves it out', () => {
    const bare = { branchId: 3, ...soldOn('2025-01-01'), warrantyMonths: [0] };
    expect(claimWeeks([...CARS, bare], [], ASKED).map(({ branchId }) => branchId)).toEqual([1, 2]);
  });
});
