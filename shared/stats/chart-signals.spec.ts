import { chartSignals } from './chart-signals';

const limits = { centre: 10, lower: 4, upper: 16 };
const times = (count: number, value: number) => new Array<number>(count).fill(value);

describe('chartSignals', () => {
  it('given no limits, has no signal', () => {
    expect(chartSignals([1, 99], undefined)).toEqual([null, null]);
  });

  it('given values beyond a limit, marks them; on a limit, not', () => {
    expect(chartSignals([3.999, 4, 10, 16, 16.001], limits)).toEqual([
      'outside_low',
      null,
      null,
      null,
      'outside_high',
    ]);
  });

  it('given 7 on one side, has no run; given 10, flags it from the 8th on', () => {
    expect(chartSignals(times(7, 9), limits)).toEqual(times(7, 0).map(() => null));
    expect(chartSignals(times(10, 9), limits).slice(6)).toEqual([
      null,
      'run_low',
      'run_low',
      'run_low',
    ]);
    expect(chartSignals(times(8, 11), limits)[7]).toBe('run_high');
  });

  it('given a value on the centre, ends the run there', () => {
    const signals = chartSignals([...times(7, 9), 10, ...times(8, 9)], limits);
    expect(signals.slice(0, 15)).toEqual(times(15, 0).map(() => null));
    expect(signals[15]).toBe('run_low');
  });

  it('given 8 on the centre, has no run', () => {
    expect(chartSignals(times(9, 10), limits)).toEqual(times(9, 0).map(() => null));
  });

  it('given a crossing, counts the other side from 1', () => {
    const signals = chartSignals([...times(7, 9), ...times(8, 11)], limits);
    expect(signals.indexOf('run_high')).toBe(14);
    expect(signals).not.toContain('run_low');
  });

  it('given a value outside within a run, says outside and counts it in the run', () => {
    const signals = chartSignals([...times(6, 9), 1, 9, 1], limits);
    expect(signals.slice(6)).toEqual(['outside_low', 'run_low', 'outside_low']);
  });

  it('given limits that do not enclose their centre or NaN, throws', () => {
    expect(() => chartSignals([1], { centre: 1, lower: 2, upper: 3 })).toThrow(RangeError);
    expect(() => chartSignals([Number.NaN], limits)).toThrow(RangeError);
  });
});
