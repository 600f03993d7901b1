import type { ClaimFreeCurve } from './claim-free-input';
import { shareAxis } from './share-axis';

function curve(...lowers: (number | null)[]): ClaimFreeCurve {
  return {
    key: 'full',
    label: 'full',
    cars: 100,
    months: lowers.map((lower, index) => ({
      month: index + 1,
      atRisk: 50,
      share: lower === null ? null : lower + 0.01,
      lower,
      upper: null,
    })),
  };
}

describe('shareAxis', () => {
  it('bands down to 92.7 %: starts at 92 in steps of 2', () => {
    const { low, ticks, decimals } = shareAxis([curve(0.98, 0.95), curve(0.927)]);
    expect(low).toBeCloseTo(0.92);
    expect(ticks.map((tick) => Math.round(tick * 100))).toEqual([92, 94, 96, 98, 100]);
    expect(decimals).toBe(0);
  });

  it('months that are not told: do not count', () => {
    expect(shareAxis([curve(0.98, null)]).low).toBeCloseTo(0.98);
  });

  it('no claim at all: the last per cent', () => {
    const { low, decimals } = shareAxis([curve()]);
    expect(low).toBeCloseTo(0.99);
    expect(decimals).toBe(1);
  });

  it('bands down to nothing: starts at 0 and not below', () => {
    expect(shareAxis([curve(0)]).low).toBeCloseTo(0);
  });
});
