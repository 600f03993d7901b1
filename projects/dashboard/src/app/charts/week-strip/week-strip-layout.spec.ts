import type { WeekStripInput } from './week-strip-input';
import { layOutWeekStrip } from './week-strip-layout';

const STRIP: WeekStripInput = {
  summary: '',
  weeks: [
    { week: '2026-W03', value: 1.1, mark: 'plain' },
    { week: '2026-W04', value: null, mark: 'plain' },
    { week: '2026-W05', value: 1.5, mark: 'outside' },
  ],
  look: 'line',
  usual: { centre: 1.2, lower: 1, upper: 1.4 },
  target: 1.3,
  scale: [0.9, 1.5],
  ticks: [{ value: 1, text: '0 %' }],
};

describe('layOutWeekStrip', () => {
  it('a week outside: its mark lies beyond the usual range, the gap breaks the line', () => {
    const { marks, usual, join, last } = layOutWeekStrip(STRIP, 280);
    expect(marks).toHaveLength(1);
    expect(marks[0]!.y).toBeLessThan(usual!.upper);
    expect(last).toEqual({ x: marks[0]!.x, y: marks[0]!.y });
    expect(join.match(/M/g)).toHaveLength(2);
  });

  it('a target: has a line of its own between those of the usual range', () => {
    const { target, usual } = layOutWeekStrip(STRIP, 280);
    expect(target!).toBeGreaterThan(usual!.upper);
    expect(target!).toBeLessThan(usual!.centre);
  });

  it('counts: are bars from nothing, without line or marks', () => {
    const { bars, join, marks, bottom } = layOutWeekStrip(
      {
        ...STRIP,
        look: 'bars',
        usual: null,
        target: null,
        scale: [0, 2],
        weeks: [
          { week: '2026-W03', value: 0, mark: 'plain' },
          { week: '2026-W04', value: 2, mark: 'plain' },
        ],
      },
      280,
    );
    expect([bars.length, join, marks.length]).toEqual([1, '', 0]);
    expect(bars[0]!.y + bars[0]!.height).toBe(bottom);
  });
});
