import fc from 'fast-check';
import { theilSenSlope } from './theil-sen-slope';

describe('theilSenSlope', () => {
  it('given no two different times, is undefined', () => {
    expect(theilSenSlope([], [])).toBeUndefined();
    expect(theilSenSlope([1], [5])).toBeUndefined();
    expect(theilSenSlope([2, 2, 2], [1, 5, 9])).toBeUndefined();
  });

  it('given pairs of equal time, leaves them out', () => {
    // Pairs by hand: (1→2) slopes 3 and 1 for the two values at time 1; the pair within time 1 has none.
    expect(theilSenSlope([1, 1, 2], [0, 2, 3])).toBe(2);
  });

  it('given level values in falling order of time, is 0 and not −0', () => {
    expect(theilSenSlope([1, 0], [39, 39])).toBe(0);
  });

  it('given one wild value on a line, keeps the slope of the line', () => {
    expect(theilSenSlope([0, 1, 2, 3, 4, 5, 6], [0, 2, 4, 600, 8, 10, 12])).toBe(2);
  });

  it('given the points in any order, gives the same slope', () => {
    const point = fc.tuple(fc.integer({ min: 0, max: 40 }), fc.integer({ min: -50, max: 50 }));
    fc.assert(
      fc.property(fc.array(point, { minLength: 2, maxLength: 25 }), (points) => {
        const slopeOf = (list: [number, number][]) =>
          theilSenSlope(
            list.map(([time]) => time),
            list.map(([, value]) => value),
          );
        expect(slopeOf([...points].reverse())).toBe(slopeOf(points));
      }),
    );
  });

  it('given lists of unequal length or NaN, throws', () => {
    expect(() => theilSenSlope([1, 2], [1])).toThrow(RangeError);
    expect(() => theilSenSlope([1, Number.NaN], [1, 2])).toThrow(RangeError);
    expect(() => theilSenSlope([1, 2], [Number.NaN, 2])).toThrow(RangeError);
  });
});
