import { giveOrTake, roundedAmount } from './give-or-take';

describe('roundedAmount', () => {
  it('given an error, says it to two digits and the amount to the same place', () => {
    expect(roundedAmount(7_656_100, 707_300)).toEqual({
      cents: 7_700_000,
      giveOrTakeCents: 1_400_000,
    });
    expect(roundedAmount(7_656_100, 70_730)).toEqual({
      cents: 7_660_000,
      giveOrTakeCents: 140_000,
    });
  });

  it('given an error of less than a hundred, is no finer than whole money', () => {
    expect(roundedAmount(123_456, 2_041)).toEqual({ cents: 123_500, giveOrTakeCents: 4_000 });
    expect(roundedAmount(123_456, 0)).toEqual({ cents: 123_500, giveOrTakeCents: 0 });
  });

  it('given no error, says two digits alone, of small sums whole money', () => {
    expect(roundedAmount(7_656_140, null)).toEqual({ cents: 7_700_000, giveOrTakeCents: null });
    expect(roundedAmount(412, null)).toEqual({ cents: 400, giveOrTakeCents: null });
    expect(roundedAmount(0, null)).toEqual({ cents: 0, giveOrTakeCents: null });
  });
});

describe('giveOrTake', () => {
  it('given a standard error, is half of the 95 % interval', () => {
    expect(giveOrTake(100)).toBeCloseTo(195.9964, 10);
  });
});
