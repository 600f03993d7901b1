import fc from 'fast-check';
import { theilSenInterval } from './theil-sen-interval';
import { theilSenSlope } from './theil-sen-slope';

describe('theilSenInterval', () => {
  it('given no two different times, is undefined', () => {
    expect(theilSenInterval([], [])).toBeUndefined();
    expect(theilSenInterval([2, 2], [1, 5])).toBeUndefined();
  });

  it('given too few pairs for limits, has a slope alone', () => {
    expect(theilSenInterval([0, 1, 2], [0, 1, 5])).toEqual({ slope: 2.5 });
  });

  it('given a line, has limits on it', () => {
    expect(theilSenInterval([0, 1, 2, 3, 4, 5], [0, 2, 4, 6, 8, 10])).toEqual({
      slope: 2,
      lower: 2,
      upper: 2,
    });
  });

  it('given two times, corrects the variance for both kinds of tie (Kendall, chapter 4)', () => {
    // Two groups of 4: 16 slopes, the differences 8 … 14 of {1,2,3,4} and {9,11,13,15}, none of the values tied.
    // 18 V = 8·7·21 − 2·(4·3·13) = 864, V = 48 (which is 4·4·9/3, as for Wilcoxon's rank sum), C = 13.579.
    // Lower rank (16 − 13.579)/2 = 1.2105: between the slopes 5 and 6.
    const found = theilSenInterval([0, 0, 0, 0, 1, 1, 1, 1], [1, 2, 3, 4, 9, 11, 13, 15]);
    expect(found?.slope).toBe(9.5);
    expect(found?.lower).toBeCloseTo(5 + 0.2105, 4);
    expect(found?.upper).toBeCloseTo(14 - 0.2105, 4);
  });

  it('given any points, encloses the slope that theilSenSlope gives', () => {
    const point = fc.tuple(fc.integer({ min: 0, max: 9 }), fc.integer({ min: -20, max: 20 }));
    fc.assert(
      fc.property(fc.array(point, { minLength: 2, maxLength: 30 }), (points) => {
        const times = points.map(([time]) => time);
        const values = points.map(([, value]) => value);
        const found = theilSenInterval(times, values);
        expect(found?.slope).toBe(theilSenSlope(times, values));
        if (found?.lower === undefined || found.upper === undefined) return;
        expect(found.lower).toBeLessThanOrEqual(found.slope);
        expect(found.upper).toBeGreaterThanOrEqual(found.slope);
      }),
    );
  });
});
