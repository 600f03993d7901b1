import type { BridgeInput, BridgeRow } from './bridge-input';
import { layOutBridge } from './bridge-layout';

function row(key: string, value: number, kind: BridgeRow['kind'] = 'step'): BridgeRow {
  const role = kind === 'total' ? 'kept' : value < 0 ? 'loss' : 'gain';
  return { key, label: key, kind, value, text: String(value), role, strong: kind === 'total' };
}

const input: BridgeInput = {
  summary: 'From 4,218 expected to 3,237 kept.',
  rows: [
    row('Expected', 421834, 'total'),
    row('Price', 37500),
    row('Planned labour', -30900),
    row('Rot labour', -73500),
    row('Product', -3359),
    row('Consumables, bought-in', -25600),
    row('Fee', -2250),
    row('Kept', 323725, 'total'),
  ],
};

describe('layOutBridge', () => {
  it('steps that add up: each bar starts where the one above ended, the last join meets the last total', () => {
    const { steps, joins } = layOutBridge(input, 412);
    expect(joins).toHaveLength(7);
    // A gain grows to the right of where it starts, a loss to the left.
    expect(steps[1]!.barX).toBeCloseTo(steps[0]!.barX + steps[0]!.barWidth, 6);
    expect(steps[2]!.barX + steps[2]!.barWidth).toBeCloseTo(steps[1]!.barX + steps[1]!.barWidth, 6);
    expect(joins[6]!.x).toBeCloseTo(steps[7]!.barX + steps[7]!.barWidth, 6);
  });

  it('rows stand 33 apart with bars of 20; the last total stands 6 further under a hairline', () => {
    const { steps, bar, rule } = layOutBridge(input, 412);
    expect(bar).toBe(20);
    expect(steps[1]!.wordY - steps[0]!.wordY).toBe(33);
    expect(steps[7]!.wordY - steps[6]!.wordY).toBe(39);
    expect(rule).toBeGreaterThan(steps[6]!.barY + 20);
    expect(rule).toBeLessThan(steps[7]!.barY);
  });

  it('a step of nothing: the joining line runs on through its row', () => {
    const rows = [row('Expected', 1000, 'total'), row('Price', 0), row('Fee', -100)];
    const { joins } = layOutBridge({ summary: '', rows }, 412);
    expect(joins[0]!.to).toBe(joins[1]!.from);
    expect(joins[0]!.x).toBe(joins[1]!.x);
  });

  it.each([320, 412, 600, 900])('%d px wide: bars stay inside', (width) => {
    for (const { barX, barWidth } of layOutBridge(input, width).steps) {
      expect(barX).toBeGreaterThanOrEqual(0);
      expect(barX + barWidth).toBeLessThanOrEqual(width + 1);
    }
  });

  it('a phone: bars move under their words and use the whole width', () => {
    const { steps } = layOutBridge(input, 296);
    expect(steps[0]!.barY).toBeGreaterThan(steps[0]!.wordY);
    expect(Math.max(...steps.map(({ barX, barWidth }) => barX + barWidth))).toBeCloseTo(295, 0);
  });

  it('a week that lost money: 0 lies inside and the total runs left of it', () => {
    const rows = [
      row('Expected', 1000, 'total'),
      row('Rot labour', -3000),
      row('Kept', -2000, 'total'),
    ];
    const { zero, steps } = layOutBridge({ summary: '', rows }, 600);
    expect(steps[2]!.barX).toBeLessThan(zero);
    expect(steps[2]!.barX + steps[2]!.barWidth).toBeCloseTo(zero, 6);
    expect(steps[0]!.barX).toBeCloseTo(zero, 6);
  });

  it('a step too small to see leaves a line of 1 px, a step of nothing none', () => {
    const rows = [
      row('Expected', 1_000_000, 'total'),
      row('Fee', -1),
      row('Price', 0),
      row('Kept', 999_999, 'total'),
    ];
    const { steps } = layOutBridge({ summary: '', rows }, 600);
    expect(steps[1]!.barWidth).toBe(1);
    expect(steps[2]!.barWidth).toBe(0);
  });

  it('only zeros: no bar, no error', () => {
    const rows = [row('Expected', 0, 'total'), row('Kept', 0, 'total')];
    const { steps } = layOutBridge({ summary: '', rows }, 600);
    expect(steps.every(({ barWidth }) => barWidth === 0)).toBe(true);
  });
});
