import { quadraticForm } from './quadratic-form';

describe('quadraticForm', () => {
  it('given a diagonal matrix, adds squares over variances', () => {
    expect(
      quadraticForm(
        [
          [4, 0],
          [0, 9],
        ],
        [2, 6],
      ),
    ).toBeCloseTo(1 + 4, 14);
  });

  it('given covariances, agrees with the inverse written out', () => {
    // Inverse of [[2, 1], [1, 3]] is [[3, −1], [−1, 2]] / 5.
    expect(
      quadraticForm(
        [
          [2, 1],
          [1, 3],
        ],
        [1, 2],
      ),
    ).toBeCloseTo((3 - 4 + 8) / 5, 14);
  });

  it('given a matrix without an inverse, is undefined', () => {
    expect(quadraticForm([[0]], [1])).toBeUndefined();
    // Rounding leaves 1e-17 of the second diagonal entry here.
    expect(
      quadraticForm(
        [
          [0.1, 0.1],
          [0.1, 0.10000000000000002],
        ],
        [1, 1],
      ),
    ).toBeUndefined();
    expect(
      quadraticForm(
        [
          [1, 2],
          [2, 4],
        ],
        [1, 1],
      ),
    ).toBeUndefined();
  });
});
