import { chartSignals } from '#shared/stats/chart-signals';
import { xmrLimits } from '#shared/stats/xmr-limits';
import { checkCases, type CheckCase } from './check-values';
import { expectFigures } from './expect-figures';

type Input = { values: number[] } | { n: number };

describe('xmrLimits', () => {
  it.each(checkCases<Input>('xmr_chart'))('given %s, agrees', (_title, check) => {
    if ('values' in check.input) expectLimits(check, check.input.values);
    else expectConstant(check, check.input.n);
  });
});

function expectLimits(check: CheckCase<Input>, values: number[]): void {
  const limits = xmrLimits(values);
  const outside = values.filter((_, index) =>
    chartSignals(values, limits)[index]?.startsWith('outside'),
  );
  expectFigures(check, {
    center: limits?.centre,
    mr_bar: limits?.meanMovingRange,
    sigma: limits && (limits.upper - limits.centre) / 3,
    ucl: limits?.upper,
    lcl: limits?.lower,
    outside,
  });
}

/** The constant behind the limits is the published one, to its three decimals; rule 5 fixes it so. */
function expectConstant(check: CheckCase<Input>, span: number): void {
  expect(span).toBe(2);
  const limits = xmrLimits([0, 1]);
  const d2 = limits && (3 * limits.meanMovingRange) / (limits.upper - limits.centre);
  expect(d2).toBeCloseTo(check.published?.['d2'] as number, 12);
  expect(Math.abs((d2 as number) - (check.expected['d2'] as number))).toBeLessThan(0.0005);
}
