import { weeksTouching } from '#shared/domain/calendar';
import { datesOfChart, datesOfWeek, WEEKS_BEFORE } from './week-dates';

describe('datesOfWeek', () => {
  it('a week over New Year: Monday of one year to Sunday of the next', () => {
    expect(datesOfWeek('2026-W01')).toEqual({ from: '2025-12-29', to: '2026-01-04' });
  });
});

describe('datesOfChart', () => {
  it('a week: it is the last of 27, so that the limits come from the weeks before it', () => {
    const { from, to } = datesOfChart('2026-W05');
    const weeks = weeksTouching(from, to);
    expect(weeks).toHaveLength(WEEKS_BEFORE + 1);
    expect(weeks.at(-1)).toBe('2026-W05');
    expect(weeks[0]).toBe('2025-W31');
  });
});
