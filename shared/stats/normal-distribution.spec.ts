import { normalQuantile, normalUpperTail, twoSidedP, Z_95 } from './normal-distribution';

describe('normalUpperTail', () => {
  it('given the ends, gives 1 and 0', () => {
    expect(normalUpperTail(Number.NEGATIVE_INFINITY)).toBe(1);
    expect(normalUpperTail(Number.POSITIVE_INFINITY)).toBe(0);
    expect(normalUpperTail(0)).toBe(0.5);
  });

  it('given steps across every change of method, falls steadily', () => {
    let before = 1;
    for (let z = -10; z < 38; z += 0.001) {
      const tail = normalUpperTail(z);
      expect(tail).toBeLessThanOrEqual(before);
      before = tail;
    }
  });

  it('given NaN, throws', () => {
    expect(() => normalUpperTail(Number.NaN)).toThrow(RangeError);
  });
});

describe('twoSidedP', () => {
  it('given a statistic of either sign, gives both tails', () => {
    expect(twoSidedP(0)).toBe(1);
    expect(twoSidedP(-2)).toBe(2 * normalUpperTail(2));
  });
});

describe('normalQuantile', () => {
  it('given the ends and the middle, gives −∞, ∞ and 0', () => {
    expect(normalQuantile(0)).toBe(Number.NEGATIVE_INFINITY);
    expect(normalQuantile(1)).toBe(Number.POSITIVE_INFINITY);
    expect(normalQuantile(0.5)).toBeCloseTo(0, 15);
  });

  it('given 0.975, gives the constant of rule 26 to its six decimals', () => {
    expect(Number(normalQuantile(0.975).toFixed(6))).toBe(Z_95);
  });

  it('given a p outside 0 to 1, throws', () => {
    for (const p of [-0.1, 1.1, Number.NaN]) expect(() => normalQuantile(p)).toThrow(RangeError);
  });
});
