import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { dayNumber, mondayOfWeek } from '#shared/domain/calendar';
import { FEWEST_WEEKS } from '#shared/domain/usual-range';
import { chartSignals } from '#shared/stats/chart-signals';
import { mannKendall } from '#shared/stats/mann-kendall';
import { theilSenSlope } from '#shared/stats/theil-sen-slope';

/** A week that is over, lies wholly in the period and billed something: only these are judged (rules 4 and 7). */
export type BilledWeek = MarginWeek & { marginShare: number };

/** Whether a week takes part in limits, signals and trend. */
export function isJudged(week: MarginWeek): week is BilledWeek {
  return week.whole && week.marginShare !== null;
}

/** Writes its signal into each week; gaps between billed weeks are skipped (rule 6). */
export function markSignals(weeks: readonly BilledWeek[], limits: MarginAnswer['limits']): void {
  const shares = weeks.map((week) => week.marginShare);
  chartSignals(shares, limits ?? undefined).forEach((signal, index) => {
    (weeks[index] as BilledWeek).signal = signal;
  });
}

/** Slope per calendar week and its p (rule 41); null with fewer than 8 weeks. */
export function trendOf(weeks: readonly BilledWeek[]): MarginAnswer['trend'] {
  if (weeks.length < FEWEST_WEEKS) return null;
  const shares = weeks.map((week) => week.marginShare);
  const times = weeks.map((week) => dayNumber(mondayOfWeek(week.week)) / 7);
  const slopePerWeek = theilSenSlope(times, shares);
  const test = mannKendall(shares);
  return slopePerWeek === undefined || !test ? null : { slopePerWeek, p: test.p };
}
