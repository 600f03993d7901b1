import fc from 'fast-check';
import { wilsonInterval } from './wilson-interval';

describe('wilsonInterval', () => {
  it('given nobody, is undefined', () => {
    expect(wilsonInterval(0, 0)).toBeUndefined();
  });

  it('given none or all, is clamped exactly to 0 or 1', () => {
    expect(wilsonInterval(0, 7)?.lower).toBe(0);
    expect(wilsonInterval(7, 7)?.upper).toBe(1);
  });

  it('given any count, encloses the share and mirrors its complement', () => {
    fc.assert(
      fc.property(
        fc
          .integer({ min: 1, max: 1_000_000 })
          .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n))),
        ([x, n]) => {
          const { estimate, lower, upper } = wilsonInterval(x, n) ?? fail();
          expect(lower).toBeGreaterThanOrEqual(0);
          expect(lower).toBeLessThanOrEqual(estimate);
          expect(upper).toBeGreaterThanOrEqual(estimate);
          expect(upper).toBeLessThanOrEqual(1);
          expect(wilsonInterval(n - x, n)?.lower).toBeCloseTo(1 - upper, 12);
        },
      ),
    );
  });

  it.each([
    [-1, 5, 0.95],
    [6, 5, 0.95],
    [1.5, 5, 0.95],
    [1, 5.5, 0.95],
    [1, -1, 0.95],
    [1, 5, 0],
    [1, 5, 1],
    [Number.NaN, 5, 0.95],
  ])('given %d of %d at level %d, throws', (x, n, level) => {
    expect(() => wilsonInterval(x, n, level)).toThrow(RangeError);
  });
});

function fail(): never {
  throw new Error('no interval');
}
