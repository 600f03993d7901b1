import { xmrLimits } from './xmr-limits';

describe('xmrLimits', () => {
  it('given fewer than 2 values, is undefined', () => {
    expect(xmrLimits([])).toBeUndefined();
    expect(xmrLimits([0.4])).toBeUndefined();
  });

  it('given equal values, closes on the centre', () => {
    expect(xmrLimits([3, 3, 3])).toEqual({
      n: 3,
      centre: 3,
      lower: 3,
      upper: 3,
      meanMovingRange: 0,
    });
  });

  it('given equal values whose sum rounds, still closes on them: a centre a hair aside would put all of them outside', () => {
    for (let numerator = 1; numerator < 500; numerator += 1) {
      const value = numerator / 870;
      for (let n = 8; n <= 26; n += 1) {
        const limits = xmrLimits(Array<number>(n).fill(value));
        expect([limits?.lower, limits?.centre, limits?.upper]).toEqual([value, value, value]);
      }
    }
  });

  it('given shares that swing widely, does not clip the limits to 0 … 1', () => {
    const limits = xmrLimits([0.1, 0.9, 0.1, 0.9]);
    expect(limits?.lower).toBeCloseTo(0.5 - (3 / 1.128) * 0.8, 12);
    expect(limits?.upper).toBeCloseTo(0.5 + (3 / 1.128) * 0.8, 12);
  });

  it('given NaN, throws', () => {
    expect(() => xmrLimits([1, Number.NaN])).toThrow(RangeError);
  });
});
