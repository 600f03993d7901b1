import { mondayOfWeek, addDays } from '#shared/domain/calendar';
import type { Role } from '#shared/domain/vocabulary';
import { formatDate, formatDateRange, formatList, formatMonth } from '../../ui/format';
import type { Period } from './scope-url';

/** Names listed in full; more are counted. */
const MOST_NAMES = 3;

/** Whose jobs, in words. */
export function placesWords(
  chosen: { readonly regions: readonly string[]; readonly branches: readonly string[] },
  own: { readonly regions: readonly string[]; readonly branches: readonly string[] },
  role: Role | undefined,
): string {
  if (chosen.branches.length > 0) return namesOrCount(chosen.branches, 'branches');
  if (chosen.regions.length > 0) return namesOrCount(chosen.regions, 'regions');
  if (role === 'head_office') return 'Whole network';
  if (role === 'regional_lead' && own.regions.length > 0) {
    return namesOrCount(own.regions, 'regions');
  }
  return own.branches.length > 0 ? namesOrCount(own.branches, 'branches') : 'All branches';
}

/** Chosen names, or the words for all of them: "full, cavity", "5 body types", "all packages". */
export function kindsWords(names: readonly string[], many: string): string {
  return names.length === 0 ? `all ${many}` : namesOrCount(names, many);
}

/** A period in words: "last 26 weeks", "1 Jan – 5 Mar 2026". */
export function periodWords(period: Period): string {
  if (period.kind === 'last') {
    return period.weeks === 1 ? 'this week so far' : `last ${period.weeks} weeks`;
  }
  return period.from === period.to
    ? formatDate(period.from)
    : formatDateRange(period.from, period.to);
}

/** Which cars by the day they were finished: "cars finished since July 2022" where none is chosen, from the first there is. */
export function completedWords(period: Period | undefined, first: string | undefined): string {
  if (!period) {
    return first ? `cars finished since ${formatMonth(first.slice(0, 7))}` : 'all cars finished';
  }
  return period.kind === 'last'
    ? `cars finished ${period.weeks === 1 ? 'this week' : `in the last ${period.weeks} weeks`}`
    : `cars finished ${periodWords(period)}`;
}

/** First and last day of a week, for the list of weeks: "26 Jan – 1 Feb 2026". */
export function weekDaysWords(week: string): string {
  const monday = mondayOfWeek(week);
  return formatDateRange(monday, addDays(monday, 6));
}

function namesOrCount(names: readonly string[], many: string): string {
  if (names.length > MOST_NAMES) return `${names.length} ${many}`;
  return names.length === 2 ? formatList(names) : names.join(', ');
}
