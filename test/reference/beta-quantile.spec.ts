import { betaQuantile } from '#shared/stats/beta-quantile';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('betaQuantile', () => {
  it.each(checkCases<{ p: number; a: number; b: number }>('beta_quantile'))(
    'given %s, agrees',
    (_title, check) => {
      const { p, a, b } = check.input;
      expectFigures(check, { x: betaQuantile(p, a, b) });
    },
  );
});
