import { wilsonInterval } from '../stats/wilson-interval';
import { shareOf } from './small-samples';

describe('shareOf', () => {
  it('four cars: no share and no interval', () => {
    expect(shareOf(2, 4)).toEqual({ share: null, lower: null, upper: null });
  });

  it('no car: no share and no interval', () => {
    expect(shareOf(0, 0)).toEqual({ share: null, lower: null, upper: null });
  });

  it('five cars: the share with its Wilson interval', () => {
    const { estimate, lower, upper } = wilsonInterval(2, 5)!;
    expect(shareOf(2, 5)).toEqual({ share: estimate, lower, upper });
    expect(estimate).toBeCloseTo(0.4);
  });
});
