import type { CheckCase } from './check-values';
import { expectFigures } from './expect-figures';

const check: CheckCase<null> = {
  id: 'made-up',
  source: 'none: this tests the comparison itself',
  input: null,
  expected: { mean: 10, list: [1, 2] },
  tolerance: { absolute: 1e-6, mean_relative: 1e-3 },
  published: { mean: 10.01 },
};

describe('expectFigures', () => {
  it('given figures within their tolerances, is content', () => {
    expectFigures(check, { mean: 10.0095, list: [1, 2.0000005] });
  });

  it.each([
    ['a figure too far off', { mean: 10.02, list: [1, 2] }],
    ['a figure that misses the published digits', { mean: 10, list: [1, 2] }],
    ['a figure that was not computed', { mean: 10.0095 }],
    ['one of a list too far off', { mean: 10.0095, list: [1, 2.00001] }],
    ['a list too long', { mean: 10.0095, list: [1, 2, 3] }],
    ['not a number', { mean: Number.NaN, list: [1, 2] }],
  ])('given %s, fails', (_circumstance, computed) => {
    expect(() => expectFigures(check, computed)).toThrow();
  });
});
