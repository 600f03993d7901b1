import fc from 'fast-check';
import { quantile } from '#shared/stats/quantile';
import { quoteMinutes } from './quote-minutes';
import {
  decimal,
  fraction,
  leavesNothing,
  plus,
  quotePrice,
  roundedHalfUp,
  type QuoteCost,
} from './quote-price';

const cost = (labour: number, over = 1): QuoteCost => ({
  labour: fraction(labour, over),
  product: fraction(0, 7),
  consumablesAndBoughtIn: fraction(0, 30),
});

describe('quotePrice', () => {
  it.each([
    // In doubles 1 − 0.05 − 0.45 is 0.49999999999999994 and the price a cent too high.
    [10_000, 0.05, 0.45, 20_000],
    [10_001, 0.05, 0.45, 20_002],
    [700, 0.1, 0.2, 1000],
    [701, 0.1, 0.2, 1002],
    [0, 0.05, 0.3, 0],
    [1, 0.05, 0.949999, 1_000_000],
  ])('given %d cents, fee %d and margin %d, is %d, rounded up', (cents, fee, margin, price) => {
    expect(quotePrice(cost(cents), fee, margin)).toBe(price);
  });

  it('given a cost between two cents, is the next whole price', () => {
    // 1/3 cent over 0.5 is 0.67.
    expect(quotePrice(cost(1, 3), 0.05, 0.45)).toBe(1);
    expect(quotePrice(cost(30_001, 3), 0.05, 0.45)).toBe(20_001);
  });

  it('given fee and margin that leave nothing, is no price', () => {
    expect(quotePrice(cost(1), 0.05, 0.95)).toBeUndefined();
    expect(leavesNothing(0.05, 0.95)).toBe(true);
    expect(leavesNothing(0.05, 0.949999)).toBe(false);
    // So little is left that the price passes 2⁵³.
    expect(quotePrice(cost(10_000), 0.05, 0.9499999999999)).toBeUndefined();
  });

  it('given any numbers, is the least price that leaves the margin', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e7 }),
        fc.integer({ min: 1, max: 999 }),
        fc.integer({ min: 0, max: 200_000 }),
        fc.integer({ min: 0, max: 700_000 }),
        (cents, over, fee, margin) => {
          const price = BigInt(quotePrice(cost(cents, over), fee / 1e6, margin / 1e6) ?? -1);
          const kept = BigInt(1_000_000 - fee - margin) * BigInt(over);
          const needed = BigInt(cents) * 1_000_000n;
          expect(price * kept >= needed).toBe(true);
          expect((price - 1n) * kept < needed).toBe(true);
        },
      ),
    );
  });
});

describe('decimal', () => {
  it.each([
    [0, 0n, 1n],
    [0.45, 45n, 100n],
    [1e-7, 1n, 10n ** 7n],
    [0.1234567, 1234567n, 10n ** 7n],
    [120, 12n * 10n, 1n],
  ])('given %d, is what is written', (value, numerator, denominator) => {
    const told = decimal(value);
    expect(told.numerator * denominator).toBe(numerator * told.denominator);
  });
});

describe('roundedHalfUp', () => {
  it('given halves, rounds them up', () => {
    expect(roundedHalfUp(fraction(5, 2))).toBe(3);
    expect(roundedHalfUp(fraction(49, 20))).toBe(2);
    expect(roundedHalfUp(plus(fraction(1, 4), fraction(1, 4)))).toBe(1);
  });
});

describe('quoteMinutes', () => {
  it('given minutes, is type 7 in whole parts', () => {
    expect(quoteMinutes([10])).toEqual({ p50Halves: 20, p80Fifths: 50 });
    // P80 of 1 … 8 lies at position 5.6: 6.6.
    expect(quoteMinutes([8, 1, 2, 3, 4, 5, 6, 7])).toEqual({ p50Halves: 9, p80Fifths: 33 });
    expect(() => quoteMinutes([])).toThrow(RangeError);
  });

  it('given any minutes, agrees with the quantile in doubles', () => {
    const drawn = fc.array(fc.nat(100_000), { minLength: 1, maxLength: 80 });
    fc.assert(
      fc.property(drawn, (minutes) => {
        const sorted = [...minutes].sort((a, b) => a - b);
        const { p50Halves, p80Fifths } = quoteMinutes(minutes);
        expect(p50Halves / 2).toBeCloseTo(quantile(sorted, 0.5) ?? NaN, 6);
        expect(p80Fifths / 5).toBeCloseTo(quantile(sorted, 0.8) ?? NaN, 6);
      }),
    );
  });
});
