import { aboutAmount } from './about-amount';

/** The standard error of so much give or take. */
const error = (reachCents: number) => reachCents / 1.959964;

describe('aboutAmount', () => {
  it('a wide interval, rounds the figure as far as the interval', () => {
    expect(aboutAmount(7_656_100, error(1_386_300))).toEqual({
      cents: 7_700_000,
      reachCents: 1_400_000,
    });
    expect(aboutAmount(4_123_456, error(912_300))).toEqual({
      cents: 4_100_000,
      reachCents: 900_000,
    });
  });

  it('a narrow interval, goes no further than whole units of money', () => {
    expect(aboutAmount(123_456, error(140))).toEqual({ cents: 123_500, reachCents: 100 });
    expect(aboutAmount(123_456, 0)).toEqual({ cents: 123_500, reachCents: 0 });
  });

  it('nothing known of the interval, says so and keeps whole units', () => {
    expect(aboutAmount(123_456, null)).toEqual({ cents: 123_500, reachCents: null });
  });
});
