import fc from 'fast-check';
import { ascending, quantile } from './quantile';

/** Adding 0 leaves −0 out: it equals 0 and no result depends on it, but `toBe` tells them apart. */
const finite = fc.double({ min: -1e9, max: 1e9, noNaN: true }).map((value) => value + 0);
const share = fc.double({ min: 0, max: 1, noNaN: true });

describe('ascending', () => {
  it('given numbers out of order, sorts a copy by size', () => {
    const values = [10, 9, -1, 100];
    expect([...ascending(values)]).toEqual([-1, 9, 10, 100]);
    expect(values).toEqual([10, 9, -1, 100]);
  });

  it('given NaN or an infinity among them, throws', () => {
    expect(() => ascending([1, Number.NaN, 2])).toThrow(RangeError);
    expect(() => ascending([Number.POSITIVE_INFINITY, 2])).toThrow(RangeError);
  });
});

describe('quantile', () => {
  it('given no values, is undefined', () => {
    expect(quantile([], 0.5)).toBeUndefined();
  });

  it('given any values, rises with p from the smallest to the largest', () => {
    fc.assert(
      fc.property(fc.array(finite, { minLength: 1 }), share, share, (list, p, q) => {
        const sorted = ascending(list);
        const [low, high] = [quantile(sorted, Math.min(p, q)), quantile(sorted, Math.max(p, q))];
        expect(low).toBeLessThanOrEqual(high as number);
        expect(quantile(sorted, 0)).toBe(sorted[0]);
        expect(quantile(sorted, 1)).toBe(sorted[sorted.length - 1]);
      }),
    );
  });

  it('given a p outside 0 to 1, throws', () => {
    for (const p of [-0.1, 1.1, Number.NaN]) expect(() => quantile([1, 2], p)).toThrow(RangeError);
  });

  it('given values in the wrong order where it looks, throws', () => {
    expect(() => quantile([3, 2, 1], 0.5)).toThrow(RangeError);
    expect(() => quantile([1, 5, 2, 9], 0.5)).toThrow(RangeError);
    expect(() => quantile([5, 1, 2, 9], 0.5)).toThrow(RangeError);
    expect(() => quantile([1, 2, 9, 3], 0.5)).toThrow(RangeError);
  });
});
