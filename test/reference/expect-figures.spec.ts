import type { CheckCase } from './check-values';
import { expectFigures } from './expect-figures';

const check: CheckCase<null> = {
  id: 'made-up',
  source: 'none: this tests the comparison itself',
  input: null,
  expected: { mean: 10, list: [1, 2], gaps: [0.5, null] },
  tolerance: { absolute: 1e-6, mean_relative: 1e-3 },
  published: { mean: 10.01, gaps: [0.5, null] },
};

const right = { mean: 10.0095, list: [1, 2], gaps: [0.5, null] };

describe('expectFigures', () => {
  it('given figures within their tolerances, is content', () => {
    expectFigures(check, { ...right, mean: 10.0095, list: [1, 2.0000005] });
  });

  it.each([
    ['a figure too far off', { ...right, mean: 10.02 }],
    ['a figure that misses the published digits', { ...right, mean: 10 }],
    ['a figure that was not computed', { mean: 10.0095, gaps: [0.5, null] }],
    ['one of a list too far off', { ...right, list: [1, 2.00001] }],
    ['a list too long', { ...right, list: [1, 2, 3] }],
    ['not a number', { ...right, mean: Number.NaN }],
    ['a figure where none is defined', { ...right, gaps: [0.5, 0] }],
    ['none where one is defined', { ...right, gaps: [null, null] }],
  ])('given %s, fails', (_circumstance, computed) => {
    expect(() => expectFigures(check, computed)).toThrow();
  });
});
