import { daysBetween, isoWeek, isWeek, mondayOf, mondayOfWeek } from '#shared/domain/calendar';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

interface Input {
  date?: string;
  from?: number;
  to?: number;
  weeks?: string[];
}

describe('isoWeek', () => {
  it.each(checkCases<Input>('iso_week'))('given %s, agrees', (_title, check) => {
    expectFigures(check, { ...partsOf(check.input.date), ...listsOf(check.input) });
  });
});

function partsOf(date: string | undefined) {
  if (!date) return {};
  const week = isoWeek(date);
  const weekday = daysBetween(mondayOf(date), date) + 1;
  return {
    iso_year: Number(week.slice(0, 4)),
    iso_week: Number(week.slice(6)),
    iso_weekday: weekday,
    text: `${week}-${weekday}`,
  };
}

function listsOf({ from = 0, to = -1, weeks = [] }: Input) {
  const years = Array.from({ length: to - from + 1 }, (_, index) => from + index);
  return {
    years: years.filter((year) => isWeek(`${year}-W53`)),
    monday: weeks.map(mondayOfWeek),
  };
}
