import { addDays, mondayOfWeek } from '#shared/domain/calendar';

/** Weeks drawn before the chosen one: as many as the limits can come from (rule 5). */
export const WEEKS_BEFORE = 26;

/** First and last day of a week. */
export function datesOfWeek(week: string): { readonly from: string; readonly to: string } {
  const monday = mondayOfWeek(week);
  return { from: monday, to: addDays(monday, 6) };
}

/**
 * Dates of the chart: the chosen week is the last of them, because the limits come from the weeks before the last billed week of a
 * period.
 */
export function datesOfChart(week: string): { readonly from: string; readonly to: string } {
  const { from, to } = datesOfWeek(week);
  return { from: addDays(from, -7 * WEEKS_BEFORE), to };
}
