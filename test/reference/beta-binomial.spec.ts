import { fitBetaBinomial, shrunkShare } from '#shared/stats/beta-binomial';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('fitBetaBinomial and shrunkShare', () => {
  it.each(checkCases<{ y: number[]; n: number[] }>('beta_binomial'))(
    'given %s, agree',
    (_title, check) => {
      const { y, n } = check.input;
      const fit = fitBetaBinomial(y, n);
      if (fit === undefined) throw new Error('no finite maximum');
      expectFigures(check, {
        ...fit,
        shrunk: y.map((count, index) => shrunkShare(fit, count, n[index] as number).share),
      });
    },
  );
});
