import { minutesTyped, TYPED } from './typed-values';

describe('minutesTyped', () => {
  it.each([
    ['90', 90],
    ['1:30', 90],
    ['1 h 30 min', 90],
    ['1h', 60],
    ['45 min', 45],
    ['1:75', undefined],
    ['an hour', undefined],
    ['-5', undefined],
  ])('typed as %s, given a person in a hurry, is %s', (text, minutes) => {
    expect(minutesTyped(text)).toBe(minutes);
  });
});

describe('TYPED', () => {
  it.each([
    ['litres', '4.2', 4200],
    ['litres', '4,25 L', 4250],
    ['litres', '4.2005', undefined],
    ['amount', '870,50', 87_050],
    ['amount', '1,120', undefined],
    ['degrees', '−3.5', -3.5],
    ['percent', '55', 55],
    ['month', '2009-13', undefined],
    ['month', '2009-05', '2009-05'],
    ['date', '2026-02-30', undefined],
    ['whole', '142 000', 142_000],
  ] as const)('%s typed as %s, given its own reading, is %s', (kind, text, value) => {
    expect(TYPED[kind].read(text)).toBe(value);
  });

  it('litres shown, given millilitres, read back as the same', () => {
    for (const ml of [0, 50, 4200, 4250, 12_345]) {
      expect(TYPED.litres.read(TYPED.litres.show(ml))).toBe(ml);
    }
  });
});
