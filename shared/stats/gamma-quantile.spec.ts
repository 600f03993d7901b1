import fc from 'fast-check';
import { gammaQuantile } from './gamma-quantile';
import { incompleteGamma } from './incomplete-gamma';

const shapes = fc.double({ min: -3, max: 7, noNaN: true }).map((power) => 10 ** power);
const shares = fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true });

describe('gammaQuantile', () => {
  it('given shape 1, is the exponential quantile', () => {
    expect(gammaQuantile(0.975, 1)).toBeCloseTo(-Math.log(0.025), 13);
    expect(gammaQuantile(1e-12, 1) / -Math.log1p(-1e-12)).toBeCloseTo(1, 13);
  });

  it('given the ends, is 0 and infinite', () => {
    expect(gammaQuantile(0, 3)).toBe(0);
    expect(gammaQuantile(1, 3)).toBe(Infinity);
    expect(gammaQuantile(0.025, 1e-3)).toBe(0);
  });

  it('given any shape and share, leads back to the share', () => {
    fc.assert(
      fc.property(shares, shapes, (p, shape) => {
        const x = gammaQuantile(p, shape);
        if (x === 0) return;
        const tails = incompleteGamma(shape, x);
        // The double nearest to x is off by up to one part in 2⁵³, which the density turns into this much of p.
        const reach = 1e-11 + 1e-14 * Math.exp(tails.density);
        expect(Math.abs(Math.exp(tails.lower) - p)).toBeLessThan(reach);
      }),
    );
  });

  it('given a larger share, is larger', () => {
    fc.assert(
      fc.property(shares, shares, shapes, (p, q, shape) => {
        if (Math.abs(p - q) < 1e-6) return;
        const ordered =
          gammaQuantile(Math.min(p, q), shape) <= gammaQuantile(Math.max(p, q), shape);
        expect(ordered).toBe(true);
      }),
    );
  });

  it.each([
    [-0.1, 1],
    [1.1, 1],
    [Number.NaN, 1],
    [0.5, 0],
    [0.5, Infinity],
    [0.5, Number.NaN],
  ])('given p %d and shape %d, throws', (p, shape) => {
    expect(() => gammaQuantile(p, shape)).toThrow(RangeError);
  });
});
