import { isoWeek, weeksTouching } from './calendar';
import { breaksOfPeriod, breaksOfWeeks, defaultPeriod, periodOf } from './period';

describe('defaultPeriod', () => {
  it('given any day of a week, begins on the Monday 51 weeks before its Monday (rule 9)', () => {
    for (const today of ['2026-02-02', '2026-02-05', '2026-02-08']) {
      expect(defaultPeriod(today)).toEqual({ from: '2025-02-10', to: today });
    }
  });

  it('given a year of 53 weeks, still holds 52', () => {
    const { from, to } = defaultPeriod('2021-01-03');
    expect(isoWeek(to)).toBe('2020-W53');
    expect(weeksTouching(from, to)).toHaveLength(52);
  });
});

describe('periodOf', () => {
  it('given one end, fills the other from the default', () => {
    const today = '2026-02-02';
    expect(periodOf({}, today)).toEqual({ from: '2025-02-10', to: today });
    expect(periodOf({ from: '2020-01-01' }, today)).toEqual({ from: '2020-01-01', to: today });
    expect(periodOf({ to: '2025-06-01' }, today)).toEqual({ from: '2025-02-10', to: '2025-06-01' });
  });
});

describe('breaksOfPeriod', () => {
  const paths = (from: string, to: string) => breaksOfPeriod({ from, to }).map(({ path }) => path);

  it('given a single day, has none; given an end before the beginning, names both', () => {
    expect(paths('2026-01-01', '2026-01-01')).toEqual([]);
    expect(paths('2026-01-02', '2026-01-01')).toEqual(['/query/from', '/query/to']);
  });
});

describe('breaksOfWeeks', () => {
  const paths = (from: string, to: string) => breaksOfWeeks({ from, to }).map(({ path }) => path);

  it('given a century, has none; given a mistyped year, names the beginning', () => {
    expect(paths('1926-01-01', '2026-01-01')).toEqual([]);
    expect(paths('1026-01-01', '2026-01-01')).toEqual(['/query/from']);
    expect(paths('2026-01-02', '2026-01-01')).toEqual(['/query/from', '/query/to']);
  });
});
