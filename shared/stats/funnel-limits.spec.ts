import fc from 'fast-check';
import { binomialLimits, poissonLimits, type FunnelLimits } from './funnel-limits';

const shares = fc.double({ min: 0, max: 1, noNaN: true });
const sizes = fc.oneof(fc.integer({ min: 1, max: 200 }), fc.integer({ min: 1, max: 1_000_000 }));

const inOrder = ({ lower998, lower95, upper95, upper998 }: FunnelLimits): boolean =>
  lower998 <= lower95 && lower95 <= upper95 && upper95 <= upper998;

describe('binomialLimits', () => {
  it('given any share and size, are numbers in order within 0 and 1', () => {
    fc.assert(
      fc.property(shares, sizes, (theta, n) => {
        const limits = binomialLimits(theta, n);
        expect(inOrder(limits)).toBe(true);
        expect(limits.lower998).toBeGreaterThanOrEqual(0);
        expect(limits.upper998).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('given a share that a few cars show, hold it between them', () => {
    // Of n cars at least 0.06 expected to show it and 0.06 not: drawn so, none is thrown away.
    fc.assert(
      fc.property(shares, sizes, (along, n) => {
        const theta = (0.06 + along * (n - 0.12)) / n;
        const { lower95, upper95 } = binomialLimits(theta, n);
        expect(lower95).toBeLessThan(theta);
        expect(upper95).toBeGreaterThan(theta);
      }),
    );
  });

  it('given failures for successes, mirror', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 0.98, noNaN: true }), sizes, (theta, n) => {
        const [one, other] = [binomialLimits(theta, n), binomialLimits(1 - theta, n)];
        // Interpolated quantiles are of steps: mirrored they may differ by one car.
        expect(Math.abs(one.upper95 - (1 - other.lower95))).toBeLessThanOrEqual(1 / n + 1e-9);
        expect(Math.abs(one.lower998 - (1 - other.upper998))).toBeLessThanOrEqual(1 / n + 1e-9);
      }),
    );
  });

  it('given more cars, are narrower, and near the normal ones at a million', () => {
    const widths = [5, 50, 500, 5000, 50_000, 1_000_000].map((n) => {
      const { lower95, upper95 } = binomialLimits(0.3, n);
      return upper95 - lower95;
    });
    expect([...widths].sort((a, b) => b - a)).toEqual(widths);
    const { upper998, lower95 } = binomialLimits(0.3, 1_000_000);
    const error = Math.sqrt((0.3 * 0.7) / 1_000_000);
    expect(Math.abs((upper998 - 0.3) / error - 3.090232)).toBeLessThan(0.005);
    expect(Math.abs((0.3 - lower95) / error - 1.959964)).toBeLessThan(0.005);
  });

  it.each([0, 1])('given a share of %d, leave nothing to chance', (theta) => {
    const all = { lower95: theta, upper95: theta, lower998: theta, upper998: theta };
    expect(binomialLimits(theta, 7)).toEqual(all);
    expect(binomialLimits(theta, 1_000_000)).toEqual(all);
  });

  it.each([1e-300, 1e-12, 1e-7, 1 - 1e-7, 1 - 1e-15])(
    'given a share of %d, are numbers at any size',
    (theta) => {
      for (const n of [1, 5, 1000, 1_000_000]) {
        const limits = Object.values(binomialLimits(theta, n)) as number[];
        expect(limits.every((limit) => limit >= 0 && limit <= 1)).toBe(true);
      }
    },
  );

  it.each([
    [-0.1, 5],
    [1.1, 5],
    [Number.NaN, 5],
    [0.5, 0],
    [0.5, 2.5],
  ])('given a share of %d of %d cars, throws', (theta, n) => {
    expect(() => binomialLimits(theta, n)).toThrow(RangeError);
  });
});

describe('poissonLimits', () => {
  it('given any mean, are counts in order, the mean between them where there is one to count', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -9, max: 6, noNaN: true }).map((power) => 10 ** power),
        (mean) => {
          const limits = poissonLimits(mean) as FunnelLimits;
          expect(inOrder(limits)).toBe(true);
          expect(limits.lower998).toBeGreaterThanOrEqual(0);
          if (mean < 0.05) return;
          expect(limits.lower95).toBeLessThan(mean);
          expect(limits.upper95).toBeGreaterThan(mean);
        },
      ),
    );
  });

  it('given cars that are many and their share small, are the binomial ones in counts', () => {
    const counts = poissonLimits(20) as FunnelLimits;
    const shares = binomialLimits(20 / 1_000_000, 1_000_000);
    expect(shares.upper998 * 1_000_000).toBeCloseTo(counts.upper998, 2);
    expect(shares.lower95 * 1_000_000).toBeCloseTo(counts.lower95, 2);
  });

  it('given nothing to expect, are none', () => {
    expect(poissonLimits(0)).toBeUndefined();
  });

  it.each([-1, Number.NaN, Infinity])('given a mean of %d, throws', (mean) => {
    expect(() => poissonLimits(mean)).toThrow(RangeError);
  });
});
