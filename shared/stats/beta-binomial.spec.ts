import fc from 'fast-check';
import { fitBetaBinomial, shrunkShare } from './beta-binomial';
import { logGamma } from './log-gamma';

/** The log-likelihood straight from its definition, sharing no code with the fit but ln Γ. */
function logLikelihood(alpha: number, beta: number, groups: readonly [number, number][]): number {
  const logBeta = (a: number, b: number) => logGamma(a) + logGamma(b) - logGamma(a + b);
  return groups.reduce(
    (sum, [y, n]) => sum + logBeta(alpha + y, beta + n - y) - logBeta(alpha, beta),
    0,
  );
}

function fitOf(groups: readonly [number, number][]) {
  return fitBetaBinomial(
    groups.map(([y]) => y),
    groups.map(([, n]) => n),
  );
}

const group = fc
  .integer({ min: 0, max: 60 })
  .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n)));

describe('fitBetaBinomial', () => {
  it.each([
    ['no group', [], []],
    ['one group', [3], [10]],
    ['one group beside empty ones', [3, 0, 0], [10, 0, 0]],
    ['no success', [0, 0, 0], [5, 9, 4]],
    ['all successes', [5, 9], [5, 9]],
    ['equal shares', [10, 20, 30], [100, 200, 300]],
    ['a spread that chance alone would exceed', [48, 50, 52, 51, 49], [100, 100, 100, 100, 100]],
    ['single trials, which tell no spread', [0, 1, 1, 0], [1, 1, 1, 1]],
    ['only all-or-none groups', [0, 4, 0, 7], [5, 4, 9, 7]],
  ])('given %s, is undefined', (_circumstance, successes, sizes) => {
    expect(fitBetaBinomial(successes, sizes)).toBeUndefined();
  });

  it('given one size, agrees with the sign of the test of spread at the edge (Tarone 1979)', () => {
    const counts = fc.array(fc.integer({ min: 0, max: 12 }), { minLength: 2, maxLength: 20 });
    fc.assert(
      fc.property(counts, (ys) => {
        const total = ys.reduce((sum, y) => sum + y, 0);
        if (total === 0 || total === 12 * ys.length) return;
        if (ys.every((y) => y === 0 || y === 12)) return;
        const p = total / (12 * ys.length);
        const pairs = ys.map((y) => (y * (y - 1)) / p + ((12 - y) * (11 - y)) / (1 - p) - 132);
        const score = pairs.reduce((sum, part) => sum + part, 0);
        if (Math.abs(score) < 1e-6) return;
        const fit = fitBetaBinomial(
          ys,
          ys.map(() => 12),
        );
        expect(fit !== undefined).toBe(score > 0);
      }),
    );
  });

  it('given any groups, finds a point that no point nearby exceeds, nor the binomial', () => {
    fc.assert(
      fc.property(fc.array(group, { minLength: 2, maxLength: 25 }), (groups) => {
        const fit = fitOf(groups);
        if (fit === undefined || fit.alpha + fit.beta > 1e5) return;
        const found = logLikelihood(fit.alpha, fit.beta, groups);
        for (const step of [0.999, 0.9, 0.3, 1.001, 1.1, 3]) {
          const { alpha, beta } = fit;
          expect(logLikelihood(alpha * step, beta, groups)).toBeLessThanOrEqual(found + 1e-8);
          expect(logLikelihood(alpha, beta * step, groups)).toBeLessThanOrEqual(found + 1e-8);
          expect(logLikelihood(alpha * step, beta * step, groups)).toBeLessThanOrEqual(
            found + 1e-8,
          );
        }
        const y = groups.reduce((sum, [part]) => sum + part, 0);
        const n = groups.reduce((sum, [, part]) => sum + part, 0);
        const pooled = y * Math.log(y / n) + (n - y) * Math.log(1 - y / n);
        expect(found).toBeGreaterThanOrEqual(pooled - 1e-8);
      }),
    );
  });

  it('given no fit, no point searched exceeds the binomial', () => {
    fc.assert(
      fc.property(fc.array(group, { minLength: 2, maxLength: 12 }), (groups) => {
        const y = groups.reduce((sum, [part]) => sum + part, 0);
        const n = groups.reduce((sum, [, part]) => sum + part, 0);
        if (y === 0 || y === n || groups.every(([part, size]) => part === 0 || part === size))
          return;
        if (groups.filter(([, size]) => size > 0).length < 2 || fitOf(groups) !== undefined) return;
        const pooled = y * Math.log(y / n) + (n - y) * Math.log(1 - y / n);
        for (const whole of [0.1, 0.5, 1, 3, 10, 30, 100, 1000]) {
          for (const share of [0.5 * (y / n), y / n, 1 - 0.5 * (1 - y / n)]) {
            const there = logLikelihood(whole * share, whole * (1 - share), groups);
            expect(there).toBeLessThanOrEqual(pooled + 1e-8);
          }
        }
      }),
    );
  });

  it('given successes and failures exchanged, exchanges the shapes', () => {
    const [successes, sizes] = [
      [1, 9, 4, 0, 17],
      [20, 22, 31, 6, 25],
    ];
    const fit = fitBetaBinomial(successes, sizes);
    const mirrored = fitBetaBinomial(
      successes.map((y, index) => (sizes[index] as number) - y),
      sizes,
    );
    expect(mirrored?.alpha).toBeCloseTo(fit?.beta as number, 8);
    expect(mirrored?.beta).toBeCloseTo(fit?.alpha as number, 8);
  });

  it('given two thousand groups of up to a million, recovers the shapes they were made with', () => {
    // Shares at the quantiles of Beta(1, 3), whose closed form is 1 − (1 − u)^(1/3).
    const sizes = Array.from({ length: 2000 }, (_, index) => 1 + ((index * 7919) % 1_000_000));
    const successes = sizes.map((n, index) =>
      Math.round(n * (1 - (1 - (index + 0.5) / 2000) ** (1 / 3))),
    );
    const fit = fitBetaBinomial(successes, sizes);
    expect(fit?.alpha).toBeCloseTo(1, 1);
    expect(fit?.beta).toBeCloseTo(3, 1);
  });

  it.each([
    ['lists of unequal length', [1, 2], [5]],
    ['more successes than there are', [6, 1], [5, 5]],
    ['half a success', [0.5, 1], [5, 5]],
    ['NaN', [Number.NaN, 1], [5, 5]],
  ])('given %s, throws', (_circumstance, successes, sizes) => {
    expect(() => fitBetaBinomial(successes, sizes)).toThrow(RangeError);
  });
});

describe('shrunkShare', () => {
  it('given a fit, lies between the group and the mean of all, inside its interval', () => {
    const found = shrunkShare({ alpha: 2, beta: 8 }, 9, 10);
    expect(found.share).toBeCloseTo(11 / 20, 15);
    expect(found.lower).toBeLessThan(found.share);
    expect(found.upper).toBeGreaterThan(found.share);
  });

  it('given nobody, is the mean of all', () => {
    expect(shrunkShare({ alpha: 2, beta: 8 }, 0, 0).share).toBeCloseTo(0.2, 15);
  });

  it('given more than there are, throws', () => {
    expect(() => shrunkShare({ alpha: 2, beta: 8 }, 3, 2)).toThrow(RangeError);
  });
});
