import type { AgeRegionCell, AgeRegionInput } from './age-region-input';
import { layOutAgeRegion } from './age-region-layout';

function cell(cars: number, share: number | null): AgeRegionCell {
  return {
    cars,
    count: String(cars),
    share,
    lower: share === null ? null : share - 0.05,
    upper: share === null ? null : share + 0.05,
  };
}

function input(regions: number, top = 0.7): AgeRegionInput {
  return {
    summary: 'By the sea most.',
    rows: [
      { key: '0-4', label: '0–4', chosen: false },
      { key: '10-14', label: '10–14', chosen: true },
      { key: '20+', label: '20+', chosen: false },
    ],
    panels: Array.from({ length: regions }, (_, index) => ({
      key: `R${index}`,
      name: `Region ${index}`,
      air: 'air C4, 62 µm a year',
      cells: [cell(90, 0.1), cell(74, top), index === 0 ? cell(2, null) : cell(0, null)],
      adjusted: '33 %',
      adjustedRange: '(27–40 %)',
      adjustedNote: '',
    })),
    references: [0.08, 0.36, null],
    referenceWord: 'network',
  };
}

describe('layOutAgeRegion', () => {
  it('three regions, 600 px: one line, panels apart and inside the picture', () => {
    const { lines, width } = layOutAgeRegion(input(3), 600);
    expect(lines).toHaveLength(1);
    const [first, second, third] = lines[0]!.panels;
    expect(first!.countX).toBeLessThan(second!.left);
    expect(second!.countX).toBeLessThan(third!.left);
    expect(third!.countX).toBeLessThanOrEqual(width);
  });

  it('three regions, a phone: one under another, each with its ages', () => {
    const { lines, height } = layOutAgeRegion(input(3), 300);
    expect(lines).toHaveLength(3);
    expect(lines.map(({ ages }) => ages.length)).toEqual([3, 3, 3]);
    expect(lines[1]!.top).toBeGreaterThan(lines[0]!.adjustedY);
    expect(height).toBeGreaterThan(lines[2]!.adjustedY);
  });

  it('six regions where five fit: three and three', () => {
    const { lines } = layOutAgeRegion(input(6), 800);
    expect(lines.map(({ panels }) => panels.length)).toEqual([3, 3]);
  });

  it('a share: dot inside its interval, interval inside the plot, on the height of its age', () => {
    const [line] = layOutAgeRegion(input(2), 600).lines;
    for (const panel of line!.panels) {
      const { share, y, reference } = panel.cells[1]!;
      expect(share!.from).toBeLessThan(share!.x);
      expect(share!.x).toBeLessThan(share!.to);
      expect(share!.from).toBeGreaterThanOrEqual(panel.left);
      expect(share!.to).toBeLessThanOrEqual(panel.plotRight);
      expect(reference).toBeLessThan(share!.x);
      expect(y).toBe(line!.ages[1]!.y);
    }
    expect(line!.strip!.y).toBeLessThan(line!.ages[1]!.y);
  });

  it('too few cars, and none: hatched, and left empty', () => {
    const [line] = layOutAgeRegion(input(2), 600).lines;
    expect(line!.panels.map(({ cells }) => cells[2]!.kind)).toEqual(['few', 'none']);
    expect(line!.panels[0]!.cells[2]!.share).toBeNull();
  });

  it('low shares: an axis that ends lower, 0 always at its left', () => {
    const texts = (top: number) =>
      layOutAgeRegion(input(1, top), 600).lines[0]!.panels[0]!.ticks.map(({ text }) => text);
    expect(texts(0.7)).toEqual(['0', '50', '100\u202f%']);
    expect(texts(0.3)).toEqual(['0', '25', '50\u202f%']);
  });

  it('not one share: an axis of the whole', () => {
    const one = input(1);
    const few = [cell(1, null), cell(1, null), cell(1, null)];
    const none = {
      ...one,
      references: [null, null, null],
      panels: [{ ...one.panels[0]!, cells: few }],
    };
    const texts = layOutAgeRegion(none, 600).lines[0]!.panels[0]!.ticks.map(({ text }) => text);
    expect(texts.at(-1)).toBe('100\u202f%');
  });

  it('narrow panels: the air is told in lines that fit, a long name is cut', () => {
    const wide = input(4);
    const panels = wide.panels.map((panel) => ({
      ...panel,
      name: 'The Far and Windy Outer Coast',
    }));
    const [line] = layOutAgeRegion({ ...wide, panels }, 600).lines;
    expect(line!.panels).toHaveLength(4);
    expect(line!.panels[0]!.air.length).toBeGreaterThan(1);
    expect(line!.panels[0]!.name).toMatch(/…$/);
    expect(line!.headY).toBeGreaterThan(30 + line!.panels[0]!.air.length * 20 - 10);
  });

  it('no region: an empty picture', () => {
    expect(layOutAgeRegion(input(0), 600)).toMatchObject({ lines: [], height: 0 });
  });
});
