import { monthDue, nextDue } from './month-due';

describe('monthDue', () => {
  it('given a day before the chosen one, nothing is due', () => {
    expect(monthDue('2026-02-04', 5)).toBeUndefined();
  });

  it('given the chosen day or a later one, the month is due as of the last day of the month before', () => {
    expect(monthDue('2026-02-05', 5)).toEqual({ month: '2026-02', asOf: '2026-01-31' });
    expect(monthDue('2024-03-28', 5)).toEqual({ month: '2024-03', asOf: '2024-02-29' });
    expect(monthDue('2026-01-01', 1)).toEqual({ month: '2026-01', asOf: '2025-12-31' });
  });
});

describe('nextDue', () => {
  it('given a month that is not done, is its day, or today when that has gone by', () => {
    expect(nextDue('2026-02-04', 5, undefined)).toBe('2026-02-05');
    expect(nextDue('2026-02-20', 5, '2025-12')).toBe('2026-02-20');
  });

  it('given a month that is done, is the day of the next', () => {
    expect(nextDue('2026-02-20', 5, '2026-02')).toBe('2026-03-05');
    expect(nextDue('2025-12-20', 28, '2025-12')).toBe('2026-01-28');
  });
});
