import { marginAxis } from './margin-axis';
import type { MarginPoint } from './weekly-margin-input';

const at = (share: number | null): MarginPoint => ({
  week: '2026-W05',
  share,
  mark: 'plain',
  flag: null,
  lines: [],
});

describe('marginAxis', () => {
  it('limits 31–46 % and a week at 29 %: three hairlines, starting a little under the lowest week', () => {
    const axis = marginAxis({
      points: [0.372, 0.42, 0.292, 0.363].map(at),
      limits: { centre: 0.387, lower: 0.309, upper: 0.464 },
      target: null,
    });
    expect(axis).toEqual({ bottom: 26, top: 50, ticks: [30, 40, 50] });
  });

  it('shares close to 0 start at 0', () => {
    const axis = marginAxis({ points: [0.02, 0.06].map(at), limits: null, target: null });
    expect(axis.bottom).toBe(0);
    expect(axis.ticks).toContain(0);
  });

  it('losses go below 0 with a hairline at 0', () => {
    const axis = marginAxis({ points: [-0.2, 0.3].map(at), limits: null, target: null });
    expect(axis.bottom).toBeLessThan(-20);
    expect(axis.ticks).toContain(0);
    expect(axis.ticks.every((tick) => !Object.is(tick, -0))).toBe(true);
  });

  it('a week far off does not flatten the others: at most one band beyond the limits', () => {
    const axis = marginAxis({
      points: [0.35, 0.4, -12].map(at),
      limits: { centre: 0.38, lower: 0.3, upper: 0.46 },
      target: null,
    });
    expect(axis.bottom).toBeGreaterThan(5);
  });

  it('without limits the axis stays within ±100 %', () => {
    const axis = marginAxis({ points: [0.35, -30].map(at), limits: null, target: null });
    expect(axis.bottom).toBeGreaterThan(-130);
  });

  it('no billed week at all still gives an axis', () => {
    expect(marginAxis({ points: [at(null)], limits: null, target: null })).toEqual({
      bottom: 0,
      top: 50,
      ticks: [0, 25, 50],
    });
  });

  it('one single share gives 2 to 5 hairlines around it', () => {
    const { bottom, top, ticks } = marginAxis({ points: [at(0.4)], limits: null, target: null });
    expect(bottom).toBeLessThan(40);
    expect(top).toBeGreaterThanOrEqual(40);
    expect(ticks.length).toBeGreaterThanOrEqual(2);
    expect(ticks.length).toBeLessThanOrEqual(5);
  });

  it('a target counts', () => {
    const axis = marginAxis({ points: [at(0.3)], limits: null, target: 0.45 });
    expect(axis.top).toBeGreaterThanOrEqual(45);
  });
});
