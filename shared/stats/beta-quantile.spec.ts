import fc from 'fast-check';
import { betaQuantile } from './beta-quantile';
import { incompleteBeta } from './incomplete-beta';

const shapes = fc.double({ min: -2, max: 7, noNaN: true }).map((power) => 10 ** power);
const shares = fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true });

describe('betaQuantile', () => {
  it.each([
    ['shapes a and 1', betaQuantile(0.025, 7, 1), 0.025 ** (1 / 7)],
    ['shapes 1 and b', betaQuantile(0.975, 1, 4), 1 - 0.025 ** (1 / 4)],
    ['both ½ (the arcsine law)', betaQuantile(0.3, 0.5, 0.5), Math.sin((Math.PI * 0.3) / 2) ** 2],
    ['equal shapes, the middle', betaQuantile(0.5, 1e6, 1e6), 0.5],
  ])('given %s, is the closed form', (_circumstance, found, expected) => {
    expect(Math.abs(found / expected - 1)).toBeLessThan(1e-12);
  });

  it('given the ends, is 0 and 1', () => {
    expect([betaQuantile(0, 2, 3), betaQuantile(1, 2, 3)]).toEqual([0, 1]);
  });

  it('given any shapes and share, leads back to the share', () => {
    fc.assert(
      fc.property(shares, shapes, shapes, (p, a, b) => {
        const x = betaQuantile(p, a, b);
        if (x === 0 || x === 1) return;
        const tails = incompleteBeta(a, b, x);
        // The double nearest to x is off by one part in 2⁵³ of itself, near 1 by as much of the rest; the density says
        // what that is of p.
        const reach = 1e-9 + (1e-14 * Math.exp(tails.density)) / Math.min(1, 1 - x);
        expect(Math.abs(Math.exp(tails.lower) - p)).toBeLessThan(reach);
      }),
    );
  });

  it('given the shapes exchanged, mirrors', () => {
    fc.assert(
      fc.property(shares, shapes, shapes, (p, a, b) => {
        expect(betaQuantile(p, a, b)).toBeCloseTo(1 - betaQuantile(1 - p, b, a), 9);
      }),
    );
  });

  it.each([
    [-0.1, 1, 1],
    [1.1, 1, 1],
    [0.5, 0, 1],
    [0.5, 1, Number.NaN],
    [0.5, Infinity, 1],
  ])('given p %d and shapes %d and %d, throws', (p, a, b) => {
    expect(() => betaQuantile(p, a, b)).toThrow(RangeError);
  });
});
