import fc from 'fast-check';
import { shareInCents } from './share-in-cents';

describe('shareInCents', () => {
  it('given shares that do not come out even, gives the cents left to the largest remainders', () => {
    // 33.33, 33.33 and 33.33: the first of equal ones gets the cent.
    expect(shareInCents(100, [1, 1, 1])).toEqual([34, 33, 33]);
    // 14.29, 28.57 and 57.14.
    expect(shareInCents(100, [1, 2, 4])).toEqual([14, 29, 57]);
  });

  it('given nothing to share or nothing to share by, gives nobody anything', () => {
    expect(shareInCents(0, [3, 5])).toEqual([0, 0]);
    expect(shareInCents(7, [0, 0])).toEqual([0, 0]);
    expect(shareInCents(7, [])).toEqual([]);
  });

  it('given any weights, adds up to the sum with each within a cent of its exact share', () => {
    const amount = fc.integer({ min: 0, max: 1_000_000_000_000 });
    const weighed = fc
      .array(amount, { minLength: 1, maxLength: 20 })
      .filter((weights) => weights.some((weight) => weight > 0));
    fc.assert(
      fc.property(amount, weighed, (sum, weights) => {
        const whole = weights.reduce((all, weight) => all + BigInt(weight), 0n);
        const shares = shareInCents(sum, weights);
        expect(shares.reduce((all, share) => all + share, 0)).toBe(sum);
        shares.forEach((share, index) => {
          const beyond = BigInt(share) * whole - BigInt(sum) * BigInt(weights[index]!);
          expect(beyond < whole && beyond > -whole).toBe(true);
        });
      }),
    );
  });
});
