import fc from 'fast-check';
import { mean, sampleVariance } from 'simple-statistics';
import { sampleMoments } from '#shared/stats/sample-moments';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

type Input = { values: number[] } | { first: number; pair: number[]; pairs: number };

describe('sampleMoments', () => {
  it.each(checkCases<Input>('strd_univariate'))('given %s, agrees', (_title, check) => {
    const moments = sampleMoments(listOf(check.input));
    expectFigures(check, {
      n: moments?.n,
      mean: moments?.mean,
      sd: moments?.standardDeviation,
    });
  });

  it('given any values, agrees with simple-statistics 7.12.1 mean and sampleVariance', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { minLength: 2 }),
        (list) => {
          const moments = sampleMoments(list);
          expect(moments?.mean).toBeCloseTo(mean(list), 8);
          expect(moments?.variance).toBeCloseTo(sampleVariance(list), 6);
        },
      ),
    );
  });
});

function listOf(input: Input): number[] {
  if ('values' in input) return input.values;
  return [input.first, ...Array.from({ length: input.pairs }, () => input.pair).flat()];
}
