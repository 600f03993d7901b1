import { xmrLimits } from '../stats/xmr-limits';

/** Weeks that limits are made from, at most (rule 5). */
export const BASELINE_WEEKS = 26;
/** Fewer weeks than this make neither limits (rule 5) nor a trend (rule 41). */
export const FEWEST_WEEKS = 8;

/** Centre and limits of weekly figures. */
export interface UsualRange {
  centre: number;
  lower: number;
  upper: number;
  baselineWeeks: number;
}

/** The usual range of weekly figures in the order of their weeks; null when they are too few (rule 5). */
export function usualRange(figures: readonly number[]): UsualRange | null {
  const limits = figures.length < FEWEST_WEEKS ? undefined : xmrLimits(figures);
  if (!limits) return null;
  const { centre, lower, upper, n } = limits;
  return { centre, lower, upper, baselineWeeks: n };
}
