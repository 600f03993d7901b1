import { barGeometry } from './bar-geometry';

describe('barGeometry', () => {
  it('of a loss lies left of zero, of a gain right of it, on one scale', () => {
    const reach = { low: -300, high: 100 };
    expect(barGeometry(-150, reach)).toEqual({ zero: 75, start: 37.5, length: 37.5, below: true });
    expect(barGeometry(100, reach)).toEqual({ zero: 75, start: 75, length: 25, below: false });
  });

  it('where all values are zero has no length and divides by nothing', () => {
    expect(barGeometry(0, { low: 0, high: 0 }).length).toBe(0);
  });
});
