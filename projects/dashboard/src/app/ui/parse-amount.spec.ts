import { amountToType, parseAmount } from './parse-amount';

describe('parseAmount', () => {
  it.each([
    ['870', 87000],
    ['870.5', 87050],
    ['870,50', 87050],
    [' 1 120.00 ', 112000],
    ['0', 0],
    ['0.05', 5],
  ])('%s: %d minor units', (text, cents) => expect(parseAmount(text)).toBe(cents));

  it.each(['', '1,120', '1.120', '-5', '8.7.0', 'abc', '870.555', '123456789'])(
    '%j: refused rather than guessed',
    (text) => expect(parseAmount(text)).toBeUndefined(),
  );
});

describe('amountToType', () => {
  it('what it writes is read back as the same cents', () => {
    for (const cents of [0, 5, 50, 100, 87050, 99999999]) {
      expect(parseAmount(amountToType(cents))).toBe(cents);
    }
  });
});
