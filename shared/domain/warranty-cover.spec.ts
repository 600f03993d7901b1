import fc from 'fast-check';
import { addDays, addMonths, dateOfDay, dayNumber, daysBetween } from './calendar';
import { CoverBook, coverOf, monthInService, warrantyEnd, yearInService } from './warranty-cover';

const dates = fc
  .integer({ min: dayNumber('2015-01-01'), max: dayNumber('2035-12-31') })
  .map(dateOfDay);

describe('warrantyEnd', () => {
  it.each([
    ['2024-03-15', 36, '2027-03-15'],
    ['2023-08-31', 6, '2024-02-29'],
    ['2024-02-29', 12, '2025-02-28'],
  ])('given %s and %d months, is %s (rule 16)', (completedOn, months, end) => {
    expect(warrantyEnd(completedOn, months)).toBe(end);
  });
});

describe('monthInService', () => {
  it.each([
    ['2024-01-31', '2024-01-31', 1],
    ['2024-01-31', '2024-02-29', 1],
    ['2024-01-31', '2024-03-01', 2],
    ['2024-01-31', '2024-03-31', 2],
    ['2024-01-31', '2024-04-01', 3],
    ['2024-01-15', '2024-02-15', 1],
    ['2024-01-15', '2024-02-16', 2],
    ['2023-12-10', '2024-12-10', 12],
  ])('given a car of %s, puts %s into month %d (rule 17)', (completedOn, day, month) => {
    expect(monthInService(completedOn, day)).toBe(month);
  });

  it('given any day after completion, is the smallest month that reaches it', () => {
    fc.assert(
      fc.property(dates, fc.integer({ min: 0, max: 3000 }), (completedOn, days) => {
        const day = addDays(completedOn, days);
        const month = monthInService(completedOn, day);
        expect(month).toBeGreaterThanOrEqual(1);
        expect(day <= addMonths(completedOn, month)).toBe(true);
        if (month > 1) expect(day > addMonths(completedOn, month - 1)).toBe(true);
      }),
    );
  });
});

describe('yearInService', () => {
  it('given months, changes after every twelfth', () => {
    expect([1, 12, 13, 24, 25].map(yearInService)).toEqual([1, 1, 2, 2, 3]);
  });
});

describe('coverOf', () => {
  it('given no warranty, is undefined', () => {
    expect(coverOf('2024-03-15', 0, '2024-05-01')).toBeUndefined();
  });

  it('given a warranty that runs, counts days up to the day and those left (rule 16)', () => {
    expect(coverOf('2024-03-15', 36, '2026-05-01')).toEqual({
      end: '2027-03-15',
      daysRun: daysBetween('2024-03-15', '2026-05-01'),
      daysLeft: daysBetween('2026-05-01', '2027-03-15'),
      daysByYear: [365, 365, daysBetween('2026-03-15', '2026-05-01')],
      lastMonth: 26,
    });
  });

  it('given a warranty that is over, ends with it (rules 16 and 17)', () => {
    expect(coverOf('2024-03-15', 24, '2030-01-01')).toEqual({
      end: '2026-03-15',
      daysRun: 730,
      daysLeft: 0,
      daysByYear: [365, 365],
      lastMonth: 24,
    });
  });

  it('given the day of completion, has run no day and is in its first month', () => {
    expect(coverOf('2024-03-15', 12, '2024-03-15')).toMatchObject({
      daysRun: 0,
      daysByYear: [0],
      lastMonth: 1,
    });
  });

  it('given any car and day, shares its days among its years in service and loses none', () => {
    const months = fc.integer({ min: 1, max: 120 });
    fc.assert(
      fc.property(dates, months, fc.integer({ min: 0, max: 5000 }), (completedOn, term, days) => {
        const cover = coverOf(completedOn, term, addDays(completedOn, days));
        if (!cover) throw new Error('no cover');
        expect(cover.daysByYear.reduce((sum, part) => sum + part, 0)).toBe(cover.daysRun);
        expect(cover.daysByYear.every((part) => part >= 0 && part <= 366)).toBe(true);
        expect(cover.daysRun + cover.daysLeft).toBe(daysBetween(completedOn, cover.end));
        expect(cover.lastMonth).toBeLessThanOrEqual(term);
        expect(cover.daysByYear).toHaveLength(yearInService(cover.lastMonth));
      }),
    );
  });
});

describe('CoverBook', () => {
  it('given cars again and again, answers as if each were worked out alone', () => {
    const book = new CoverBook('2026-05-01');
    for (const months of [0, 24, 36, 24, 0]) {
      expect(book.coverOf('2024-03-15', months)).toEqual(
        coverOf('2024-03-15', months, '2026-05-01'),
      );
    }
  });
});
