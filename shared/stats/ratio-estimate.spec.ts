import { ratioEstimate } from './ratio-estimate';

describe('ratioEstimate', () => {
  it('given no pair or estimates of 0 in total, is undefined', () => {
    expect(ratioEstimate([], [])).toBeUndefined();
    expect(ratioEstimate([3, 4], [0, 0])).toBeUndefined();
  });

  it('given one pair, has a ratio and no standard error', () => {
    expect(ratioEstimate([12], [10])).toEqual({
      n: 1,
      ratio: 1.2,
      standardError: undefined,
      lower: undefined,
      upper: undefined,
    });
  });

  it('given the same ratio everywhere, has a standard error of 0', () => {
    const estimate = ratioEstimate([15, 30, 45], [10, 20, 30]);
    expect(estimate).toEqual({ n: 3, ratio: 1.5, standardError: 0, lower: 1.5, upper: 1.5 });
  });

  it('given a negative actual value, counts it as a margin below 0', () => {
    expect(ratioEstimate([-10, 30], [50, 50])?.ratio).toBe(0.2);
  });

  it('given lists of unequal length, a negative estimate or NaN, throws', () => {
    expect(() => ratioEstimate([1, 2], [1])).toThrow(RangeError);
    expect(() => ratioEstimate([1, 2], [1, -1])).toThrow(RangeError);
    expect(() => ratioEstimate([1, Number.NaN], [1, 1])).toThrow(RangeError);
    expect(() => ratioEstimate([1, 1], [1, Number.NaN])).toThrow(RangeError);
  });
});
