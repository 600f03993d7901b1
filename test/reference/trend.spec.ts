import { mannKendall } from '#shared/stats/mann-kendall';
import { theilSenInterval } from '#shared/stats/theil-sen-interval';
import { theilSenSlope } from '#shared/stats/theil-sen-slope';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('theilSenSlope, theilSenInterval and mannKendall', () => {
  it.each(checkCases<{ x: number[]; t: number[] }>('theil_sen_mann_kendall'))(
    'given %s, agree',
    (_title, check) => {
      const test = mannKendall(check.input.x);
      const interval = theilSenInterval(check.input.t, check.input.x);
      expectFigures(check, {
        n: test?.n,
        S: test?.s,
        var_S: test?.variance,
        Z: test?.z,
        p_two_sided: test?.p,
        sen_slope: theilSenSlope(check.input.t, check.input.x),
        sen_limits: [interval?.lower ?? Number.NaN, interval?.upper ?? Number.NaN],
      });
    },
  );
});
