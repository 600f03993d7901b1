import { compoundSum } from './compound-sum';

describe('compoundSum', () => {
  it('given a fixed number, adds the variances', () => {
    const sum = compoundSum({ mean: 4, variance: 0 }, { mean: 10, variance: 9 });
    expect(sum).toEqual({ mean: 40, variance: 36 });
  });

  it('given a fixed amount, scales the number', () => {
    const sum = compoundSum({ mean: 4, variance: 3 }, { mean: 10, variance: 0 });
    expect(sum).toEqual({ mean: 40, variance: 300 });
  });

  it('given every outcome counted out, has their mean and variance', () => {
    // N is 0, 1 or 2 with ¼, ½, ¼; an amount is 0 or 1 with ½ each. Sums by hand: P(0) = ¼ + ¼ + 1/16 = 9/16,
    // P(1) = ¼ + ⅛ = 6/16, P(2) = 1/16; mean ½, variance 10/16 − ¼ = ⅜.
    const sum = compoundSum({ mean: 1, variance: 0.5 }, { mean: 0.5, variance: 0.25 });
    expect(sum).toEqual({ mean: 0.5, variance: 0.375 });
  });

  it('given a negative variance or number, or NaN, throws', () => {
    const amount = { mean: 1, variance: 1 };
    expect(() => compoundSum({ mean: 1, variance: -1 }, amount)).toThrow(RangeError);
    expect(() => compoundSum({ mean: -1, variance: 1 }, amount)).toThrow(RangeError);
    expect(() => compoundSum(amount, { mean: Number.NaN, variance: 1 })).toThrow(RangeError);
  });
});
