import type { TemperatureClass, UseByTemperatureInput } from './use-by-temperature-input';
import { layOutUseByTemperature } from './use-by-temperature-layout';

function at(fromC: number, quartiles: [number, number, number] | null): TemperatureClass {
  const [p25, median, p75] = quartiles ?? [0, 0, 0];
  return { fromC, toC: fromC + 5, count: '40', quartiles: quartiles && { p25, median, p75 } };
}

const input: UseByTemperatureInput = {
  summary: 'Less when warm.',
  tick: String,
  classes: [
    at(-5, null),
    at(5, [4000, 4200, 4500]),
    at(10, [3800, 4000, 4300]),
    at(15, [3500, 3800, 4100]),
  ],
};

describe('layOutUseByTemperature', () => {
  it.each([288, 400])('%d px wide: more use stands higher, warmer further right', (width) => {
    const { classes, top, bottom, right } = layOutUseByTemperature(input, width);
    const [, cold, , warm] = classes;
    expect(cold!.bar!.median).toBeLessThan(warm!.bar!.median);
    expect(cold!.x).toBeLessThan(warm!.x);
    for (const { bar, left, width: wide } of classes) {
      expect(left + wide).toBeLessThanOrEqual(right);
      if (!bar) continue;
      expect(bar.top).toBeGreaterThanOrEqual(top);
      expect(bar.top + bar.height).toBeLessThanOrEqual(bottom);
      expect(bar.median).toBeGreaterThan(bar.top);
    }
  });

  it('a class that no car fell in: its place stays empty, its ends are not named twice', () => {
    const { degrees, classes } = layOutUseByTemperature(input, 400);
    expect(degrees.map(({ text }) => text)).toEqual(['−5', '0', '5', '10', '15', '20']);
    expect(classes[1]!.x - classes[0]!.x).toBeCloseTo(2 * (classes[2]!.x - classes[1]!.x), 6);
  });

  it('the axis: its lowest tick stands on the axis line and says where it starts', () => {
    const { ticks, bottom } = layOutUseByTemperature(input, 400);
    expect(ticks[0]).toEqual({ y: bottom, text: '3500' });
    expect(ticks.length).toBeLessThanOrEqual(5);
  });

  it('too few cars in a class: no bar; in all: no ticks', () => {
    expect(layOutUseByTemperature(input, 400).classes[0]!.bar).toBeNull();
    const none = layOutUseByTemperature({ ...input, classes: [at(5, null)] }, 400);
    expect(none.ticks).toEqual([]);
    expect(none.classes).toHaveLength(1);
  });

  it('many narrow classes: degrees that would touch are left out', () => {
    const classes = Array.from({ length: 14 }, (_, index) => at(index * 5 - 20, [1, 2, 3]));
    const { degrees } = layOutUseByTemperature({ ...input, classes }, 240);
    for (let i = 1; i < degrees.length; i++) {
      expect(degrees[i]!.x - degrees[i - 1]!.x).toBeGreaterThan(20);
    }
  });
});
