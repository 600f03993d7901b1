import fc from 'fast-check';
import { medianSorted, quantileSorted } from 'simple-statistics';
import { ascending, quantile } from '#shared/stats/quantile';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1 });

describe('quantile', () => {
  it.each(checkCases<{ values: number[]; p: number[] }>('quantiles'))(
    'given %s, agrees',
    (_title, check) => {
      const sorted = ascending(check.input.values);
      expectFigures(check, {
        type7: check.input.p.map((p) => quantile(sorted, p) as number),
        type7_p90: quantile(sorted, 0.9),
      });
    },
  );

  it('given any values, agrees with simple-statistics 7.12.1 quantileSorted and medianSorted', () => {
    fc.assert(
      fc.property(values, fc.double({ min: 0, max: 1, noNaN: true }), (list, p) => {
        const sorted = ascending(list);
        expect(quantile(sorted, p)).toBeCloseTo(quantileSorted([...sorted], p), 8);
        expect(quantile(sorted, 0.5)).toBeCloseTo(medianSorted([...sorted]), 8);
      }),
      { numRuns: 500 },
    );
  });
});
