import { binomialLimits, poissonLimits, type FunnelLimits } from '#shared/stats/funnel-limits';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('binomialLimits', () => {
  it.each(checkCases<{ theta: number; n: number[] }>('funnel_limits'))(
    'given %s, agrees',
    (_title, check) => {
      const { theta, n } = check.input;
      expectFigures(check, listed(n.map((cars) => binomialLimits(theta, cars))));
    },
  );
});

describe('poissonLimits', () => {
  it.each(checkCases<{ mean: number[] }>('poisson_funnel_limits'))(
    'given %s, agrees',
    (_title, check) => {
      const limits = check.input.mean.map((mean) => poissonLimits(mean) as FunnelLimits);
      expectFigures(check, listed(limits));
    },
  );
});

function listed(limits: readonly FunnelLimits[]): Record<keyof FunnelLimits, number[]> {
  return {
    lower95: limits.map(({ lower95 }) => lower95),
    upper95: limits.map(({ upper95 }) => upper95),
    lower998: limits.map(({ lower998 }) => lower998),
    upper998: limits.map(({ upper998 }) => upper998),
  };
}
