import fc from 'fast-check';
import { pooledRiskRatio, type RiskStratum } from './mantel-haenszel';

const groups = fc
  .integer({ min: 0, max: 400 })
  .chain((total) => fc.tuple(fc.integer({ min: 0, max: total }), fc.constant(total)));
const strata = fc.array(
  fc.tuple(groups, groups).map(([exposed, unexposed]) => stratum(...exposed, ...unexposed)),
  { minLength: 1, maxLength: 5 },
);

describe('pooledRiskRatio', () => {
  it('given one stratum, is the plain ratio with the usual interval of its logarithm', () => {
    const found = pooledRiskRatio([stratum(30, 200, 20, 400)]);
    expect(found?.riskRatio).toBeCloseTo(3, 12);
    const error = Math.sqrt(1 / 30 - 1 / 200 + 1 / 20 - 1 / 400);
    expect(found?.upper).toBeCloseTo(3 * Math.exp(1.959963984540054 * error), 10);
  });

  it('given a group without a case, or nobody, is undefined', () => {
    expect(pooledRiskRatio([])).toBeUndefined();
    expect(pooledRiskRatio([stratum(0, 50, 4, 90)])).toBeUndefined();
    expect(pooledRiskRatio([stratum(4, 50, 0, 90)])).toBeUndefined();
    expect(pooledRiskRatio([stratum(0, 0, 4, 90)])).toBeUndefined();
  });

  it('given everyone a case, is exactly 1, never not a number', () => {
    const sizes = fc.integer({ min: 1, max: 5_000_000 });
    fc.assert(
      fc.property(sizes, sizes, (exposed, unexposed) => {
        const found = pooledRiskRatio([stratum(exposed, exposed, unexposed, unexposed)]);
        expect(found?.riskRatio).toBe(1);
        expect(found?.lower).toBeCloseTo(1, 6);
        expect(found?.upper).toBeCloseTo(1, 6);
      }),
    );
  });

  it('given a stratum with one group empty beside others, is not changed by it', () => {
    const full = [stratum(5, 60, 7, 300), stratum(9, 40, 12, 200)];
    expect(pooledRiskRatio([...full, stratum(3, 8, 0, 0), stratum(0, 0, 0, 0)])).toEqual(
      pooledRiskRatio(full),
    );
  });

  it('given any strata, encloses its ratio and turns over with the groups', () => {
    fc.assert(
      fc.property(strata, (list) => {
        const found = pooledRiskRatio(list);
        const turned = pooledRiskRatio(
          list.map((one) =>
            stratum(one.unexposedCases, one.unexposedTotal, one.exposedCases, one.exposedTotal),
          ),
        );
        expect(found === undefined).toBe(turned === undefined);
        if (!found || !turned) return;
        expect(found.lower).toBeLessThanOrEqual(found.riskRatio);
        expect(found.upper).toBeGreaterThanOrEqual(found.riskRatio);
        expect(turned.riskRatio * found.riskRatio).toBeCloseTo(1, 9);
        expect(turned.lower * found.upper).toBeCloseTo(1, 9);
      }),
    );
  });

  it.each([
    [-1, 5],
    [6, 5],
    [1.5, 5],
    [Number.NaN, 5],
  ])('given %d cases of %d, throws', (cases, total) => {
    expect(() => pooledRiskRatio([stratum(cases, total, 1, 5)])).toThrow(RangeError);
  });
});

function stratum(
  exposedCases: number,
  exposedTotal: number,
  unexposedCases: number,
  unexposedTotal: number,
): RiskStratum {
  return { exposedCases, exposedTotal, unexposedCases, unexposedTotal };
}
