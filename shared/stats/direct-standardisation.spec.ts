import { directlyStandardised } from './direct-standardisation';

describe('directlyStandardised', () => {
  it('given no band, or a standard of nobody, is undefined', () => {
    expect(directlyStandardised([], [], [])).toBeUndefined();
    expect(directlyStandardised([1, 2], [10, 10], [0, 0])).toBeUndefined();
  });

  it('given the group itself as the standard, is the plain share', () => {
    expect(directlyStandardised([3, 5], [10, 40], [10, 40])?.rate).toBeCloseTo(8 / 50, 15);
  });

  it('given weights by hand, is their mean and encloses it', () => {
    // Half of the standard at 0.3, half at 0.1: 0.2.
    const found = directlyStandardised([3, 1], [10, 10], [500, 500]);
    expect(found?.rate).toBeCloseTo(0.2, 15);
    expect(found?.lower).toBeLessThan(0.2);
    expect(found?.upper).toBeGreaterThan(0.2);
  });

  it('given nearly all of very few, goes above 1 unclamped', () => {
    expect(directlyStandardised([2], [2], [1])?.upper).toBeGreaterThan(1);
  });

  it.each([
    ['an empty band', [0], [0], [1]],
    ['unequal lists', [0, 1], [1], [1]],
    ['a negative count', [-1], [1], [1]],
    ['a negative weight', [1], [1], [-1]],
    ['NaN', [Number.NaN], [1], [1]],
  ])('given %s, throws', (_circumstance, events, sizes, standard) => {
    expect(() => directlyStandardised(events, sizes, standard)).toThrow(RangeError);
  });

  it('given a level outside 0 to 1, throws', () => {
    expect(() => directlyStandardised([1], [2], [1], 1)).toThrow(RangeError);
  });
});
