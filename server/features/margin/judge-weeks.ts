import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { dayNumber, mondayOfWeek } from '#shared/domain/calendar';
import { chartSignals } from '#shared/stats/chart-signals';
import { mannKendall } from '#shared/stats/mann-kendall';
import { theilSenSlope } from '#shared/stats/theil-sen-slope';
import { xmrLimits } from '#shared/stats/xmr-limits';

/** Weeks that limits are made from, at most (rule 5). */
export const BASELINE_WEEKS = 26;
/** Fewer weeks than this make neither limits (rule 5) nor a trend (rule 41). */
const FEWEST_WEEKS = 8;

/** A week that is over, lies wholly in the period and billed something: only these are judged (rules 4 and 7). */
export type BilledWeek = MarginWeek & { marginShare: number };

/** Whether a week takes part in limits, signals and trend. */
export function isJudged(week: MarginWeek): week is BilledWeek {
  return week.whole && week.marginShare !== null;
}

/** Limits from margin shares in the order of their weeks; null when they are too few. */
export function limitsOf(shares: readonly number[]): MarginAnswer['limits'] {
  const limits = shares.length < FEWEST_WEEKS ? undefined : xmrLimits(shares);
  if (!limits) return null;
  const { centre, lower, upper, n } = limits;
  return { centre, lower, upper, baselineWeeks: n };
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
