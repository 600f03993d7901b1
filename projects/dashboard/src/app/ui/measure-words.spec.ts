import {
  formatMeasure,
  formatMeasureChange,
  formatTarget,
  measureOfTyped,
  measureToType,
} from './measure-words';

describe('formatMeasure', () => {
  it('each measure, as its unit is read', () => {
    expect(formatMeasure('overrun', 1.2)).toBe('+20\u202f%');
    expect(formatMeasure('overrun', 0.95)).toBe('\u22125\u202f%');
    expect(formatMeasure('product', 1.04)).toBe('104\u202f%');
    expect(formatMeasure('margin', 0.364)).toBe('36\u202f%');
    expect(formatMeasure('claims', 17.36)).toBe('17');
    expect(formatMeasure('claims', 7.36)).toBe('7.4');
  });
});

describe('formatMeasureChange', () => {
  it('a difference, given without its sign, with its unit', () => {
    expect(formatMeasureChange('overrun', -0.06)).toBe('6 points');
    expect(formatMeasureChange('margin', 0.01)).toBe('1 point');
    expect(formatMeasureChange('margin', 0.004)).toBe('0.4 points');
    expect(formatMeasureChange('claims', -2.12)).toBe('2.1 per 1,000 car-years');
  });
});

describe('measureOfTyped', () => {
  it.each([
    ['overrun', '20', 1.2],
    ['overrun', '+20 %', 1.2],
    ['overrun', '−5', 0.95],
    ['product', '100 %', 1],
    ['margin', '35,5', 0.355],
    ['claims', '17.5', 17.5],
  ] as const)('%s typed as "%s", becomes %d', (measure, typed, value) => {
    expect(measureOfTyped(measure, typed)).toBeCloseTo(value, 9);
  });

  it.each([
    ['overrun', 'a fifth'],
    ['overrun', '−120'],
    ['margin', '120'],
    ['margin', '-3'],
    ['claims', '17 %'],
    ['claims', ''],
    ['product', '1,050.5'],
  ] as const)('%s typed as "%s", is no target', (measure, typed) => {
    expect(measureOfTyped(measure, typed)).toBeUndefined();
  });

  it('what is set, typed back, is the same value', () => {
    for (const measure of ['overrun', 'product', 'margin', 'claims'] as const) {
      const value = measure === 'claims' ? 17.5 : measure === 'margin' ? 0.355 : 1.07;
      expect(measureOfTyped(measure, measureToType(measure, value))).toBeCloseTo(value, 9);
    }
  });
});

describe('formatTarget', () => {
  it('a value that was set, keeps the digits it was given', () => {
    expect(formatTarget('overrun', 1.075)).toBe('+7.5\u202f%');
    expect(formatTarget('margin', 0.35)).toBe('35\u202f%');
    expect(formatTarget('claims', 17.5)).toBe('17.5');
  });
});
