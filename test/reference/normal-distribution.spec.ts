import fc from 'fast-check';
import { normalQuantile, normalUpperTail } from '#shared/stats/normal-distribution';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('normalUpperTail and normalQuantile', () => {
  it.each(checkCases<{ z?: number[]; p?: number[] }>('normal_distribution'))(
    'given %s, agree',
    (_title, check) => {
      expectFigures(check, {
        upper_tail: (check.input.z ?? []).map(normalUpperTail),
        quantile: (check.input.p ?? []).map(normalQuantile),
        q1: normalUpperTail(1),
        q2: normalUpperTail(2),
        q3: normalUpperTail(3),
        z975: normalQuantile(0.975),
      });
    },
  );

  it('given any probability, undo each other', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-300, max: 0.999, noNaN: true }), (p) => {
        const back = normalUpperTail(-normalQuantile(p));
        expect(Math.abs(back / p - 1)).toBeLessThan(1e-11);
      }),
      { numRuns: 1000 },
    );
  });
});
