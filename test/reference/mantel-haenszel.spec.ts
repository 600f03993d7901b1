import { pooledRiskRatio } from '#shared/stats/mantel-haenszel';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

/** Per stratum: exposed cases and others, unexposed cases and others. */
type Input = Record<'a' | 'b' | 'c' | 'd', number[]>;

describe('pooledRiskRatio', () => {
  it.each(checkCases<Input>('mantel_haenszel'))('given %s, agrees', (_title, check) => {
    const { a, b, c, d } = check.input;
    const found = pooledRiskRatio(
      a.map((exposedCases, index) => ({
        exposedCases,
        exposedTotal: exposedCases + at(b, index),
        unexposedCases: at(c, index),
        unexposedTotal: at(c, index) + at(d, index),
      })),
    );
    expectFigures(check, {
      rr: found?.riskRatio,
      rr_lower: found?.lower,
      rr_upper: found?.upper,
    });
  });
});

function at(list: readonly number[], index: number): number {
  return list[index] as number;
}
