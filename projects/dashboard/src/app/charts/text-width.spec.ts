import { textWidth, widestText } from './text-width';

describe('textWidth', () => {
  // Widths read from the shipped font in a browser at 14 px.
  it.each([
    ['46 upper limit', 400, 96.3],
    ['Consumables, bought-in', 400, 168],
    ['4,218.34', 600, 59.2],
  ] as const)('%s at weight %d comes within 4 %% of the drawn width', (text, weight, drawn) => {
    expect(Math.abs(textWidth(text, weight) - drawn) / drawn).toBeLessThan(0.04);
  });

  it('a letter outside the table still takes room', () => {
    expect(textWidth('Ω')).toBeGreaterThan(5);
  });
});

describe('widestText', () => {
  it('several lines give the widest, none gives 0', () => {
    expect(widestText(['a', 'www', 'bb'])).toBe(textWidth('www'));
    expect(widestText([])).toBe(0);
  });
});
