import type { Referrers } from '#db/queries/referrers';
import { tellReferrers } from './take-out';

const NONE: Referrers = { jobs: 0, underWay: 0, norms: 0, costs: 0, bookings: 0, lastRevision: 7 };

describe('tellReferrers', () => {
  it.each([
    [{ jobs: 12, norms: 3 }, '12 jobs and 3 norms refer'],
    [{ jobs: 1 }, '1 job refers'],
    [{ costs: 1, norms: 1 }, '1 norm and 1 dated cost refer'],
    [{ jobs: 2, underWay: 1, bookings: 1 }, '2 jobs, 1 car under way and 1 booking refer'],
    [{}, undefined],
  ])('given %j, says it in words', (some, words) => {
    expect(tellReferrers({ ...NONE, ...some })).toBe(words);
  });
});
