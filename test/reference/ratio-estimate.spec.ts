import fc from 'fast-check';
import { ratioEstimate } from '#shared/stats/ratio-estimate';
import { checkCases, type CheckCase } from './check-values';
import { expectFigures } from './expect-figures';

interface Input {
  actual: number[];
  estimated: number[];
  actual_sum?: number;
  estimated_sum?: number;
}

/** What the source prints beside the ratio, with its own tolerances. */
interface Printed {
  influence: number[];
  influence_absolute: number;
  interval_divisor_n: [number, number];
  interval_absolute: number;
}

const cases = checkCases<Input>('ratio_estimator');

describe('ratioEstimate', () => {
  it.each(cases)('given %s, agrees', (_title, check) => {
    const { actual, estimated } = check.input;
    const estimate = ratioEstimate(actual, estimated);
    expectFigures(check, {
      n: estimate?.n,
      ratio: estimate?.ratio,
      standard_error: estimate?.standardError,
    });
    if (check.input.actual_sum) expect(total(actual)).toBe(check.input.actual_sum);
    if (check.input.estimated_sum) expect(total(estimated)).toBe(check.input.estimated_sum);
  });

  it.each(cases.filter(([, check]) => printedOf(check)))(
    'given %s, agrees with the printed interval once its divisor n is allowed for',
    (_title, check) => {
      const { actual, estimated } = check.input;
      const printed = printedOf(check) as Printed;
      const { n, ratio, standardError } = estimateOf(actual, estimated);
      const influence = actual.map(
        (a, i) => (a - ratio * at(estimated, i)) / (total(estimated) / n),
      );
      influence.forEach((value, index) => {
        expect(Math.abs(value - at(printed.influence, index))).toBeLessThan(
          printed.influence_absolute,
        );
      });
      const reach = 1.959964 * standardError * Math.sqrt((n - 1) / n);
      const [lower, upper] = printed.interval_divisor_n;
      expect(Math.abs(ratio - reach - lower)).toBeLessThan(printed.interval_absolute);
      expect(Math.abs(ratio + reach - upper)).toBeLessThan(printed.interval_absolute);
    },
  );

  it('given any whole minutes, agrees with rule 26 expanded and computed in exact whole numbers', () => {
    const minutes = fc.tuple(
      fc.integer({ min: 0, max: 100_000 }),
      fc.integer({ min: 1, max: 100_000 }),
    );
    fc.assert(
      fc.property(fc.array(minutes, { minLength: 2, maxLength: 60 }), (pairs) => {
        const [actual, estimated] = [pairs.map(([a]) => a), pairs.map(([, e]) => e)];
        const { n, ratio, standardError, lower, upper } = estimateOf(actual, estimated);
        // Σ(a − r·e)² = (Saa·E² − 2·A·E·Sae + A²·See) / E² with r = A/E: no rounding before the last division.
        const [A, E] = [BigInt(total(actual)), BigInt(total(estimated))];
        const squares =
          crossSum(actual, actual) * E * E -
          2n * A * E * crossSum(actual, estimated) +
          A * A * crossSum(estimated, estimated);
        const exact = (Math.sqrt(Number(squares) / (n * (n - 1))) * n) / Number(E) / Number(E);
        expect(Math.abs(standardError - exact)).toBeLessThanOrEqual(1e-9 * exact + 1e-12 * ratio);
        expect(ratio).toBeCloseTo(Number(A) / Number(E), 10);
        expect(upper - ratio).toBeCloseTo(1.959964 * exact, 8);
        expect(ratio - lower).toBeCloseTo(1.959964 * exact, 8);
      }),
      { numRuns: 300 },
    );
  });
});

function estimateOf(actual: number[], estimated: number[]) {
  const estimate = ratioEstimate(actual, estimated);
  if (estimate?.standardError === undefined) throw new Error('no standard error');
  return estimate as { [K in keyof typeof estimate]: number };
}

function printedOf(check: CheckCase<Input>): Printed | undefined {
  return (check as CheckCase<Input> & { printed?: Printed }).printed;
}

function total(values: number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}

function crossSum(a: number[], b: number[]): bigint {
  return a.reduce((sum, value, index) => sum + BigInt(value) * BigInt(at(b, index)), 0n);
}

function at(values: number[], index: number): number {
  const value = values[index];
  if (value === undefined) throw new Error(`nothing at ${index}`);
  return value;
}
