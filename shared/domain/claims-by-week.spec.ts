import { carsUnderCover, claimsByStretch, countedClaims } from './claims-by-week';
import { CoverBook } from './warranty-cover';

const TODAY = '2026-02-02';
/** Three weeks one after another, the last not over. */
const WEEKS = [
  { from: '2026-01-19', to: '2026-01-25' },
  { from: '2026-01-26', to: '2026-02-01' },
  { from: '2026-02-02', to: '2026-02-08' },
];
const claim = (over: object = {}) => ({
  ...{ branchId: 1, completedOn: '2025-02-01', warrantyMonths: 12, madeOn: '2026-01-20' },
  ...{ decision: 'accepted' as const, decidedOn: null, ...over },
});

describe('countedClaims', () => {
  it('given claims within cover, past it, refused and to come, keeps the first', () => {
    const within = claim({ madeOn: '2026-02-01' });
    const others = [
      claim({ madeOn: '2026-02-02' }),
      claim({ warrantyMonths: 0 }),
      claim({ decision: 'refused' as const, decidedOn: '2026-01-21' }),
      claim({ completedOn: '2026-01-01', madeOn: '2026-02-03' }),
    ];
    expect(countedClaims([within, ...others], new CoverBook(TODAY), TODAY)).toEqual([within]);
  });
});

describe('claimsByStretch', () => {
  it('given first and last days and a day outside, puts each where its day lies, branch by branch', () => {
    const made = ['2026-01-19', '2026-01-25', '2026-01-26', '2026-01-18'];
    const claims = made.map((madeOn) => claim({ madeOn }));
    const other = claim({ branchId: 2, madeOn: '2026-02-02' });
    const [first, second, third] = claims;
    expect(claimsByStretch([...claims, other], WEEKS)).toEqual(
      new Map([
        [1, [[first, second], [third], []]],
        [2, [[], [], [other]]],
      ]),
    );
  });

  it('given none in any stretch, has no branch', () => {
    expect(claimsByStretch([claim({ madeOn: '2020-01-01' })], WEEKS).size).toBe(0);
  });
});

describe('carsUnderCover', () => {
  const under = (completedOn: string, months = 12, today = TODAY) =>
    carsUnderCover({ completedOn: [completedOn], warrantyMonths: [months] }, WEEKS, today);

  it.each([
    ['finished long before', '2025-06-01', [1, 1, 1]],
    ['finished on the last day of a week', '2026-01-25', [1, 1, 1]],
    ['finished on the first day of the next', '2026-01-26', [0, 1, 1]],
    ['whose cover ends on the first day of a week', '2025-01-26', [1, 1, 0]],
    ['whose cover ended the day before', '2025-01-25', [1, 0, 0]],
    ['whose cover ended before all of them', '2024-01-01', [0, 0, 0]],
    ['finished after all of them', '2026-03-01', [0, 0, 0]],
  ])('given a car %s, counts it in the weeks in which it is under cover', (_, day, counts) => {
    expect(under(day)).toEqual(counts);
  });

  it('given weeks that have not come, counts nothing in them', () => {
    expect(under('2025-06-01', 12, '2026-01-27')).toEqual([1, 1, 0]);
  });

  it('given a car without warranty, never counts it', () => {
    expect(under('2025-06-01', 0)).toEqual([0, 0, 0]);
  });

  it('given several cars, adds them up', () => {
    const cars = {
      completedOn: ['2025-06-01', '2026-01-26', '2025-01-25', '2025-06-01'],
      warrantyMonths: [12, 36, 12, 12],
    };
    expect(carsUnderCover(cars, WEEKS, TODAY)).toEqual([3, 3, 3]);
  });
});
