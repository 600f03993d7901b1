import { spreadLabels } from './spread-labels';

describe('spreadLabels', () => {
  it('labels far apart stay where they are', () => {
    expect(spreadLabels([10, 60, 110], 18)).toEqual([10, 60, 110]);
  });

  it('two labels at one place part evenly to either side', () => {
    expect(spreadLabels([50, 50], 18)).toEqual([41, 59]);
  });

  it('a third label pushed into a pair moves the whole block, order of the input kept', () => {
    expect(spreadLabels([60, 50, 52], 18)).toEqual([72, 36, 54]);
  });

  it('blocks that meet while parting are joined, no two closer than the gap', () => {
    const spread = spreadLabels([10, 12, 30, 31, 80], 18).sort((a, b) => a - b);
    for (let i = 1; i < spread.length; i++) {
      expect(spread[i]! - spread[i - 1]!).toBeGreaterThanOrEqual(18 - 1e-9);
    }
    expect(spread[4]).toBe(80);
  });

  it('no labels give none', () => {
    expect(spreadLabels([], 18)).toEqual([]);
  });
});
