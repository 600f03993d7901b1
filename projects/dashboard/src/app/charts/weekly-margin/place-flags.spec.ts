import { placeFlags } from './place-flags';

const plot = { left: 0, right: 600, top: 0, bottom: 240 };

describe('placeFlags', () => {
  it('a mark with free room has its sentence at its left', () => {
    const [flag] = placeFlags([{ x: 300, y: 100, text: 'Week 46: below, 29 %' }], [], plot);
    expect(flag).toEqual({ x: 288, y: 100, anchor: 'end', text: 'Week 46: below, 29 %' });
  });

  it('a mark at the left end has it at its right', () => {
    const [flag] = placeFlags([{ x: 20, y: 100, text: 'Week 46: below, 29 %' }], [], plot);
    expect(flag?.anchor).toBe('start');
  });

  it('points at the left move it to where it covers none', () => {
    const points = [
      { x: 200, y: 100 },
      { x: 260, y: 98 },
    ];
    const [flag] = placeFlags([{ x: 300, y: 100, text: 'Week 46: below' }], points, plot);
    expect(flag?.anchor).toBe('start');
  });

  it('a limit through the mark moves it off the line', () => {
    const [flag] = placeFlags([{ x: 300, y: 100, text: 'Week 46: below' }], [], plot, [100]);
    expect(Math.abs((flag?.y ?? 100) - 100)).toBeGreaterThan(9);
  });

  it('another mark at the left is not written over', () => {
    const wishes = [
      { x: 250, y: 100, text: 'Week 45: below' },
      { x: 300, y: 100, text: 'Week 46: below' },
    ];
    const flags = placeFlags(wishes, [], plot);
    expect(flags.map(({ anchor }) => anchor)).toEqual(['end', 'start']);
  });

  it('neighbours never write over each other; the newest chooses first, one without a place is left out', () => {
    const tight = { left: 0, right: 150, top: 60, bottom: 140 };
    const wishes = Array.from({ length: 6 }, (_, index) => ({
      x: 60 + index * 4,
      y: 100,
      text: `Week ${10 + index}: below`,
    }));
    const flags = placeFlags(wishes, [], tight);
    expect(flags.length).toBeLessThan(6);
    expect(flags.at(-1)?.text).toBe('Week 15: below');
  });

  it('only places over the line: left out, unless it must be said', () => {
    const crowded = Array.from({ length: 60 }, (_, index) => ({
      x: index * 10,
      y: 10 + ((index * 37) % 220),
    }));
    const wish = { x: 300, y: 120, text: 'Week 47: 8th in a row below centre' };
    expect(placeFlags([wish], crowded, plot)).toEqual([]);
    expect(placeFlags([{ ...wish, must: true }], crowded, plot)).toHaveLength(1);
  });

  it('a sentence wider than the plot is left out', () => {
    const narrow = { left: 0, right: 60, top: 0, bottom: 240 };
    expect(placeFlags([{ x: 30, y: 100, text: 'Week 46: below, 29 %' }], [], narrow)).toEqual([]);
  });
});
