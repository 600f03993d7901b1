import {
  addDays as addDaysOfLibrary,
  addMonths as addMonthsOfLibrary,
  differenceInCalendarDays,
  format,
  parseISO,
  startOfISOWeek,
} from 'date-fns';
import fc from 'fast-check';
import {
  addDays,
  addMonths,
  ageBand,
  ageInYears,
  dateOfDay,
  dayNumber,
  daysBetween,
  isDate,
  isMonth,
  isoWeek,
  isWeek,
  localDate,
  mondayOf,
  mondayOfWeek,
  weeksTouching,
} from './calendar';

/** Library reference of this spec: date-fns 4.4.0. Published ISO weeks are checked in test/reference. */
const text = (date: Date) => format(date, 'yyyy-MM-dd');
const day = fc.integer({ min: dayNumber('1000-01-01'), max: dayNumber('9998-12-31') });
const date = day.map(dateOfDay);
/** Days that stay within the calendar when 400 are added or taken. */
const amid = fc
  .integer({ min: dayNumber('1002-01-01'), max: dayNumber('9996-12-31') })
  .map(dateOfDay);
const plausible = fc
  .integer({ min: dayNumber('1950-01-01'), max: dayNumber('2100-12-31') })
  .map(dateOfDay);

describe('dayNumber and dateOfDay', () => {
  it('given the first day of 1970, count from 0', () => {
    expect(dayNumber('1970-01-01')).toBe(0);
    expect(dateOfDay(-1)).toBe('1969-12-31');
  });

  it('given any day, undo each other', () => {
    fc.assert(fc.property(day, (number) => expect(dayNumber(dateOfDay(number))).toBe(number)));
  });

  it('given every day from 1999 to 2033, follow the platform calendar', () => {
    for (let number = dayNumber('1999-01-01'); number <= dayNumber('2033-12-31'); number += 1) {
      expect(dateOfDay(number)).toBe(new Date(number * 86_400_000).toISOString().slice(0, 10));
    }
  });
});

describe('addDays, daysBetween and mondayOf', () => {
  it('given any day, agree with date-fns', () => {
    fc.assert(
      fc.property(amid, fc.integer({ min: -400, max: 400 }), (from, days) => {
        const to = addDays(from, days);
        expect(to).toBe(text(addDaysOfLibrary(parseISO(from), days)));
        expect(daysBetween(from, to)).toBe(days);
        expect(daysBetween(from, to)).toBe(differenceInCalendarDays(parseISO(to), parseISO(from)));
        expect(mondayOf(from)).toBe(text(startOfISOWeek(parseISO(from))));
      }),
    );
  });
});

describe('addMonths', () => {
  it.each([
    ['2024-01-31', 1, '2024-02-29'],
    ['2023-01-31', 1, '2023-02-28'],
    ['2024-02-29', 12, '2025-02-28'],
    ['2024-10-31', 1, '2024-11-30'],
    ['2024-11-30', 1, '2024-12-30'],
    ['2024-12-31', 2, '2025-02-28'],
    ['2024-03-31', -1, '2024-02-29'],
    ['2024-01-15', -1, '2023-12-15'],
    ['2024-05-31', 36, '2027-05-31'],
    ['2024-05-31', 0, '2024-05-31'],
  ])(
    'given %s and %d months, gives %s (rule 16: clipped to the last of the month)',
    (from, months, to) => {
      expect(addMonths(from, months)).toBe(to);
    },
  );

  it('given any day, agrees with date-fns', () => {
    fc.assert(
      fc.property(plausible, fc.integer({ min: -240, max: 240 }), (from, months) => {
        expect(addMonths(from, months)).toBe(text(addMonthsOfLibrary(parseISO(from), months)));
      }),
    );
  });
});

describe('isoWeek and mondayOfWeek', () => {
  it('given any day, agree with date-fns', () => {
    fc.assert(
      fc.property(date, (on) => {
        expect(isoWeek(on)).toBe(format(parseISO(on), "RRRR-'W'II"));
        expect(mondayOfWeek(isoWeek(on))).toBe(mondayOf(on));
      }),
      { numRuns: 1000 },
    );
  });

  it('given every day around each new year from 1990 to 2060, agree with date-fns', () => {
    for (let year = 1990; year <= 2060; year += 1) {
      for (let offset = -8; offset <= 8; offset += 1) {
        const on = addDays(`${year}-01-01`, offset);
        expect(isoWeek(on)).toBe(format(parseISO(on), "RRRR-'W'II"));
      }
    }
  });
});

describe('weeksTouching', () => {
  it('given a Sunday and a Monday, lists both weeks (rule 54)', () => {
    expect(weeksTouching('2026-01-04', '2026-01-05')).toEqual(['2026-W01', '2026-W02']);
  });

  it('given one day, lists one week; given an end before its start, none', () => {
    expect(weeksTouching('2026-12-31', '2026-12-31')).toEqual(['2026-W53']);
    expect(weeksTouching('2026-01-12', '2026-01-05')).toEqual([]);
  });

  it('given any period, lists exactly the weeks of its days, oldest first', () => {
    fc.assert(
      fc.property(plausible, fc.integer({ min: 0, max: 800 }), (from, length) => {
        const days = Array.from({ length: length + 1 }, (_, index) =>
          isoWeek(addDays(from, index)),
        );
        expect(weeksTouching(from, addDays(from, length))).toEqual([...new Set(days)]);
      }),
    );
  });
});

describe('isDate, isMonth and isWeek', () => {
  it.each(['2024-02-29', '2000-02-29', '1000-01-01', '9999-12-31'])('given %s, is a date', (on) => {
    expect(isDate(on)).toBe(true);
  });

  it.each([
    '2023-02-29',
    '1900-02-29',
    '2024-13-01',
    '2024-00-10',
    '2024-04-31',
    '2024-01-00',
    '0999-12-31',
    '2024-1-1',
    '2024-01-01T00:00',
    ' 2024-01-01',
    '',
  ])('given "%s", is no date', (on) => {
    expect(isDate(on)).toBe(false);
  });

  it('given months and weeks, tells the real ones', () => {
    expect(['2009-05', '2009-12'].map(isMonth)).toEqual([true, true]);
    expect(['2009-00', '2009-13', '2009-5', '0009-05', '2009-05-01'].some(isMonth)).toBe(false);
    expect(['2026-W53', '2025-W52', '2026-W01'].map(isWeek)).toEqual([true, true, true]);
    expect(['2025-W53', '2026-W00', '2026-W54', '2026-53', '2026-W1'].some(isWeek)).toBe(false);
  });
});

describe('ageInYears', () => {
  it.each([
    ['2009-05', '2026-01-28', 16],
    ['2009-05', '2026-04-30', 16],
    ['2009-05', '2026-05-01', 17],
    ['2026-01', '2026-01-01', 0],
    ['2025-12', '2026-11-30', 0],
    ['2025-12', '2026-12-01', 1],
  ])(
    'given %s completed %s, is %d (rule 31: calendar months / 12)',
    (registered, completed, years) => {
      expect(ageInYears(registered, completed)).toBe(years);
    },
  );
});

describe('ageBand', () => {
  it.each([
    [0, '0-4'],
    [4, '0-4'],
    [5, '5-9'],
    [9, '5-9'],
    [10, '10-14'],
    [15, '15-19'],
    [19, '15-19'],
    [20, '20+'],
    [63, '20+'],
  ])('given %d years, is %s', (years, band) => {
    expect(ageBand(years)).toBe(band);
  });
});

describe('localDate', () => {
  it('given one instant, is already tomorrow in one zone and still today in another', () => {
    const instant = new Date('2026-01-28T23:30:00Z');
    expect(localDate(instant, 'UTC')).toBe('2026-01-28');
    expect(localDate(instant, 'Etc/GMT-2')).toBe('2026-01-29');
    expect(localDate(instant, 'Etc/GMT+2')).toBe('2026-01-28');
  });

  it('given midnight UTC on the first of a month, is still in the month before west of there', () => {
    expect(localDate(new Date('2026-03-01T00:00:00Z'), 'Etc/GMT+1')).toBe('2026-02-28');
  });
});
