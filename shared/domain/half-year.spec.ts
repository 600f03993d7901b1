import fc from 'fast-check';
import { addDays, dateOfDay, dayNumber } from './calendar';
import {
  halfYearLater,
  halfYearOf,
  halfYearsBetween,
  halfYearsFrom,
  lastHalfYearEnd,
} from './half-year';

const dates = fc
  .integer({ min: dayNumber('1990-01-01'), max: dayNumber('2090-12-31') })
  .map(dateOfDay);

describe('halfYearOf', () => {
  it.each([
    ['2024-01-01', '2024-H1'],
    ['2024-06-30', '2024-H1'],
    ['2024-07-01', '2024-H2'],
    ['2024-12-31', '2024-H2'],
  ])('given %s, is %s', (date, halfYear) => {
    expect(halfYearOf(date)).toBe(halfYear);
  });
});

describe('halfYearLater and halfYearsBetween', () => {
  it('given half-years beside each other, step over New Year', () => {
    expect(halfYearLater('2024-H2', 1)).toBe('2025-H1');
    expect(halfYearLater('2024-H1', -1)).toBe('2023-H2');
    expect(halfYearsBetween('2023-H2', '2025-H1')).toBe(3);
  });

  it('given any step, undo each other', () => {
    fc.assert(
      fc.property(dates, fc.integer({ min: -60, max: 60 }), (date, steps) => {
        const from = halfYearOf(date);
        expect(halfYearsBetween(from, halfYearLater(from, steps))).toBe(steps);
      }),
    );
  });
});

describe('halfYearsFrom', () => {
  it('given one to another, lists both and all between', () => {
    expect(halfYearsFrom('2024-H2', '2026-H1')).toEqual([
      '2024-H2',
      '2025-H1',
      '2025-H2',
      '2026-H1',
    ]);
  });

  it('given the second earlier, is empty', () => {
    expect(halfYearsFrom('2024-H2', '2024-H1')).toEqual([]);
  });
});

describe('lastHalfYearEnd', () => {
  it.each([
    ['2024-12-31', '2024-12-31'],
    ['2024-12-30', '2024-06-30'],
    ['2024-06-30', '2024-06-30'],
    ['2024-06-29', '2023-12-31'],
    ['2024-01-01', '2023-12-31'],
  ])('given %s, is %s (rule 18)', (date, end) => {
    expect(lastHalfYearEnd(date)).toBe(end);
  });

  it('given any day, is the end of a half-year and less than one before it', () => {
    fc.assert(
      fc.property(dates, (date) => {
        const end = lastHalfYearEnd(date);
        expect(end <= date).toBe(true);
        const after = halfYearOf(addDays(end, 1));
        expect(halfYearsBetween(halfYearOf(end), after)).toBe(1);
        expect(halfYearsBetween(halfYearOf(end), halfYearOf(date))).toBe(end === date ? 0 : 1);
      }),
    );
  });
});
