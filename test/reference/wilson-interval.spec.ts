import fc from 'fast-check';
import { wilsonInterval } from '#shared/stats/wilson-interval';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('wilsonInterval', () => {
  it.each(checkCases<{ x: number; n: number; level: number }>('wilson_interval'))(
    'given %s, agrees',
    (_title, check) => {
      const { x, n, level } = check.input;
      expectFigures(check, { ...wilsonInterval(x, n, level) });
    },
  );

  it('given any share, has limits at which the score test is just significant (definition of Wilson 1927)', () => {
    fc.assert(
      fc.property(
        fc
          .integer({ min: 1, max: 100_000 })
          .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n))),
        ([x, n]) => {
          const interval = wilsonInterval(x, n);
          for (const limit of [interval?.lower as number, interval?.upper as number]) {
            if (limit === 0 || limit === 1) continue;
            const score = Math.abs(x / n - limit) / Math.sqrt((limit * (1 - limit)) / n);
            expect(score).toBeCloseTo(1.959963984540054, 6);
          }
        },
      ),
    );
  });
});
