import type { OutOf } from '#shared/contracts/endpoint';
import type { listJobs } from '#shared/contracts/job-list';
import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { isoWeek } from '#shared/domain/calendar';
import { datesOfWeek } from './week-dates';

/** The answers that make the page, all of one week. */
export interface WeekAnswers {
  /** The chart's weeks, the chosen one last. */
  readonly chart: MarginAnswer;
  /** The chosen week alone: its bridge. */
  readonly week: MarginAnswer;
  /** Billed cars of the week, worst first, as many as one page of the list holds. */
  readonly billed: OutOf<typeof listJobs>;
  /** Cars finished by the end of the week and not billed, longest wait first. */
  readonly unbilled: OutOf<typeof listJobs>;
}

/** What can be said of a week, and why not where nothing can. */
export type StandingKind =
  | 'to_come'
  | 'no_cars'
  | 'unbilled_only'
  | 'uncosted'
  | 'billed_nothing'
  | 'so_far'
  | 'no_limits'
  | 'inside'
  | 'below'
  | 'above'
  | 'run_low'
  | 'run_high';

/** A week and how it stands. */
export interface Standing {
  readonly kind: StandingKind;
  readonly week: string;
  readonly figures: MarginWeek;
  /** Billed cars with all their costs: those behind the margin. */
  readonly cars: number;
  /** Billed cars left out because a cost is missing. */
  readonly leftOut: number;
  /** Weeks running on one side of the centre, this one included; 0 unless it is a run. */
  readonly running: number;
}

/** The week that the answers speak of: the last of the chart's period. */
export function weekOf(answers: Pick<WeekAnswers, 'chart'>): string {
  return isoWeek(answers.chart.period.to);
}

/** Judges the chosen week. `today` is the scope's. */
export function standingOf(answers: WeekAnswers, today: string): Standing {
  const week = weekOf(answers);
  const figures = answers.chart.weeks.find((one) => one.week === week) ?? emptyWeek(week);
  const billed = figures.jobs - figures.unbilled;
  const leftOut = countLeftOut(answers, billed);
  const kind = kindOf(answers, figures, billed - leftOut, today);
  return {
    kind,
    week,
    figures,
    cars: billed - leftOut,
    leftOut,
    running: kind === 'run_low' || kind === 'run_high' ? countRunning(answers.chart, week) : 0,
  };
}

function kindOf(
  { chart }: WeekAnswers,
  figures: MarginWeek,
  cars: number,
  today: string,
): StandingKind {
  const { from, to } = datesOfWeek(figures.week);
  if (figures.jobs === 0) return from > today ? 'to_come' : 'no_cars';
  if (figures.jobs === figures.unbilled) return 'unbilled_only';
  if (cars === 0) return 'uncosted';
  if (figures.marginShare === null) return 'billed_nothing';
  if (to >= today && !figures.whole) return 'so_far';
  if (!chart.limits) return 'no_limits';
  switch (figures.signal) {
    case 'outside_low':
      return 'below';
    case 'outside_high':
      return 'above';
    case 'run_low':
    case 'run_high':
      return figures.signal;
    case null:
      return 'inside';
  }
}

/** Billed cars without a margin. The list may be cut at a page; then the answer's own count, which includes unbilled cars, bounds it. */
function countLeftOut({ billed: list, week }: WeekAnswers, billed: number): number {
  if (week.withoutCost === 0) return 0;
  if (list.nextCursor === null) {
    return list.items.filter(({ marginCents }) => (marginCents ?? null) === null).length;
  }
  return Math.min(billed, week.withoutCost);
}

/** How many judged weeks up to this one lie on its side of the centre without a break (rule 6). */
export function countRunning(chart: MarginAnswer, week: string): number {
  const { limits } = chart;
  if (!limits) return 0;
  let running = 0;
  let side = 0;
  for (const { week: name, marginShare, whole } of chart.weeks) {
    if (marginShare === null || !whole) continue;
    const now = Math.sign(marginShare - limits.centre);
    running = now !== 0 && now === side ? running + 1 : Math.abs(now);
    side = now;
    if (name === week) return running;
  }
  return 0;
}

function emptyWeek(week: string): MarginWeek {
  return {
    week,
    jobs: 0,
    unbilled: 0,
    unbilledCostCents: 0,
    revenueCents: 0,
    labourCents: 0,
    productCents: 0,
    consumablesCents: 0,
    boughtInCents: 0,
    feeCents: 0,
    marginCents: 0,
    marginShare: null,
    expectedMarginCents: 0,
    signal: null,
    whole: false,
  };
}
