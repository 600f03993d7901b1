import fc from 'fast-check';
import { chiSquareUpperTail } from './chi-square';
import { twoSidedP } from './normal-distribution';

const statistics = fc.double({ min: 0, max: 300, noNaN: true });

describe('chiSquareUpperTail', () => {
  it('given one degree of freedom, is the two-sided p of its root', () => {
    fc.assert(
      fc.property(statistics, (x) => {
        expect(chiSquareUpperTail(x, 1) / twoSidedP(Math.sqrt(x))).toBeCloseTo(1, 10);
      }),
    );
  });

  it('given two degrees of freedom, is exponential', () => {
    fc.assert(
      fc.property(statistics, (x) => {
        expect(chiSquareUpperTail(x, 2) / Math.exp(-x / 2)).toBeCloseTo(1, 10);
      }),
    );
  });

  it('given 0, is 1', () => {
    expect(chiSquareUpperTail(0, 3)).toBe(1);
  });

  it.each([
    [-1, 1],
    [Number.NaN, 1],
    [1, 0],
    [1, 1.5],
  ])('given %d with %d degrees of freedom, throws', (x, degrees) => {
    expect(() => chiSquareUpperTail(x, degrees)).toThrow(RangeError);
  });
});
