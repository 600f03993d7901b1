import { between, day, decimals, exactMoney, percent, signedMoney, whole } from './format';

describe('numbers of the printed report', () => {
  it('given amounts, are written as British English does, with a true minus', () => {
    expect(signedMoney(7_656_149, 'EUR')).toBe('€76,561');
    expect(signedMoney(-120_000, 'NOK')).toBe('−NOK 1,200');
    expect(exactMoney(123_456_789)).toBe('1,234,567.89');
    expect(whole(-0.2)).toBe('0');
    expect(decimals(-0.004, 2)).toBe('0.00');
    expect(decimals(-1.25, 1)).toBe('−1.3');
  });

  it('given shares, intervals and days, are words that can be read aloud', () => {
    expect(percent(0.974, 1)).toBe('97.4\u2009%');
    expect(between(0.784, 1.32, 2)).toBe('0.78 to 1.32');
    expect(between(null, null, 2)).toBe('–');
    expect(day('2026-02-01')).toBe('1 February 2026');
  });
});
