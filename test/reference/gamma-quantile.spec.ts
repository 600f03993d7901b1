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
});
