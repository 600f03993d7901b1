import { isoWeek, addDays, mondayOfWeek } from '#shared/domain/calendar';
import { weekAxis } from './week-axis';

function weeksFrom(first: string, count: number): string[] {
  const monday = mondayOfWeek(first);
  return Array.from({ length: count }, (_, index) => isoWeek(addDays(monday, 7 * index)));
}

describe('weekAxis', () => {
  const x = (index: number): number => 50 + index * 21;

  it('27 weeks over New Year: every fourth week by its number, years parted between week 52 and week 1', () => {
    const axis = weekAxis(weeksFrom('2025-W31', 27), x, 21, 36);
    expect(axis.numbers.map(({ text }) => text)).toEqual(['32', '36', '40', '44', '48', '52', '4']);
    expect(axis.years.map(({ text }) => text)).toEqual(['weeks of 2025', '2026']);
    // Week 52 of 2025 is the 22nd of them, so the boundary runs half a week after it.
    expect(axis.boundaries).toEqual([x(21) + 10.5]);
  });

  it('a year of 53 weeks keeps its last week before the boundary', () => {
    const axis = weekAxis(weeksFrom('2026-W40', 27), x, 21, 36);
    expect(axis.boundaries).toEqual([x(13) + 10.5]);
    expect(axis.years[1]?.text).toBe('2027');
  });

  it('weeks of one year only: the year once, at the right end', () => {
    const axis = weekAxis(weeksFrom('2025-W10', 27), x, 21, 36);
    expect(axis.boundaries).toEqual([]);
    expect(axis.years).toEqual([{ x: x(26), text: 'weeks of 2025', anchor: 'end' }]);
  });

  it('no room before the boundary: the words go after it', () => {
    const axis = weekAxis(weeksFrom('2025-W51', 27), x, 21, 36);
    expect(axis.years.map(({ text }) => text)).toEqual(['weeks of 2026']);
  });

  it('a phone shows fewer numbers, never closer than 52 px', () => {
    const narrow = (index: number): number => 30 + index * 8;
    const axis = weekAxis(weeksFrom('2025-W31', 27), narrow, 8, 24);
    expect(axis.numbers.map(({ text }) => text)).toEqual(['32', '40', '48']);
  });

  it('few weeks name each of them', () => {
    const axis = weekAxis(weeksFrom('2025-W31', 3), (index) => index * 100, 100, 0);
    expect(axis.numbers.map(({ text }) => text)).toEqual(['31', '32', '33']);
  });

  it('no weeks name nothing', () => {
    expect(weekAxis([], x, 21, 36)).toEqual({ numbers: [], years: [], boundaries: [] });
  });
});
