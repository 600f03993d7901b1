import { gammaQuantile } from '#shared/stats/gamma-quantile';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('gammaQuantile', () => {
  it.each(checkCases<{ p: number; shape: number }>('gamma_quantile'))(
    'given %s, agrees',
    (_title, check) => {
      expectFigures(check, { x: gammaQuantile(check.input.p, check.input.shape) });
    },
  );

  it.each(checkCases<{ count: number; exposure: number; level: number }>('poisson_exact'))(
    'given the exact limits of a count in %s, agrees',
    (_title, check) => {
      const { count, exposure, level } = check.input;
      const tail = (1 - level) / 2;
      expectFigures(check, {
        rate: count / exposure,
        lower: count === 0 ? 0 : gammaQuantile(tail, count) / exposure,
        upper: gammaQuantile(1 - tail, count + 1) / exposure,
      });
    },
  );
});
