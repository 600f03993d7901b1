import { logGamma } from './log-gamma';

describe('logGamma', () => {
  it.each([
    [1, 0],
    [2, 0],
    [0.5, Math.log(Math.PI) / 2],
    [11, Math.log(3628800)],
    // Abramowitz and Stegun (1964), table 6.1: ln Γ(1.5) = −0.1207822376.
    [1.5, -0.1207822376352453],
  ])('given %d, is its closed form', (x, expected) => {
    expect(logGamma(x)).toBeCloseTo(expected, 13);
  });

  it('given 0 or less, throws', () => {
    expect(() => logGamma(0)).toThrow(RangeError);
    expect(() => logGamma(-1.5)).toThrow(RangeError);
  });
});
