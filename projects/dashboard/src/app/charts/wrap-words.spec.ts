import { textWidth } from './text-width';
import { wrapWords } from './wrap-words';

describe('wrapWords', () => {
  it('a text that fits, wide enough: one line', () => {
    expect(wrapWords('air C4, 62 µm a year', 200)).toEqual(['air C4, 62 µm a year']);
  });

  it('a text too wide, half its width: lines that fit and hold every word in order', () => {
    const lines = wrapWords('air C4, 62 µm a year', 110);
    expect(lines.length).toBe(2);
    expect(lines.join(' ')).toBe('air C4, 62 µm a year');
    for (const line of lines) expect(textWidth(line)).toBeLessThanOrEqual(110);
  });

  it('one long word, narrower than it: the word alone on its line', () => {
    expect(wrapWords('a corrosivity b', 20)).toEqual(['a', 'corrosivity', 'b']);
  });

  it('no words, any width: no lines', () => {
    expect(wrapWords('', 100)).toEqual([]);
  });
});
