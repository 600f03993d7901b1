import { roundedMoney } from './rounded-money';

describe('roundedMoney', () => {
  it('a sum with its interval: to two figures of the interval', () => {
    expect(roundedMoney(7_656_100, 1_386_300, 'EUR')).toEqual({
      sum: '€77,000',
      giveOrTake: '14,000',
    });
  });

  it('a sum known to the tenth: not rounded further than its interval allows', () => {
    expect(roundedMoney(7_656_140, 2_300, 'EUR')).toEqual({ sum: '€76,561', giveOrTake: '23' });
  });

  it('without an interval: to two figures of its own', () => {
    expect(roundedMoney(7_656_100, null, 'EUR')).toEqual({ sum: '€77,000', giveOrTake: null });
  });

  it('small sums: to whole money', () => {
    expect(roundedMoney(412, 0, 'EUR')).toEqual({ sum: '€4', giveOrTake: '0' });
  });
});
