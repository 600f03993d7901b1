import { sampleMoments } from './sample-moments';

describe('sampleMoments', () => {
  it('given no value, is undefined', () => {
    expect(sampleMoments([])).toBeUndefined();
  });

  it('given one value, has a mean and no spread', () => {
    expect(sampleMoments([7])).toEqual({
      n: 1,
      mean: 7,
      variance: undefined,
      standardDeviation: undefined,
    });
  });

  it('given several, divides by n − 1', () => {
    expect(sampleMoments(Float64Array.of(2, 4, 6))).toEqual({
      n: 3,
      mean: 4,
      variance: 4,
      standardDeviation: 2,
    });
  });

  it('given NaN, throws', () => {
    expect(() => sampleMoments([1, Number.NaN])).toThrow(RangeError);
  });
});
