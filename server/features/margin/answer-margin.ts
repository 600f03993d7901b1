import { listEarlierWeeks, listMissingCosts, sumWeeks, type WeekSums } from '#db/queries/margin';
import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { Bridge, MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { addDays, dayNumber, mondayOfWeek, weeksTouching } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import { chartSignals } from '#shared/stats/chart-signals';
import { mannKendall } from '#shared/stats/mann-kendall';
import { theilSenSlope } from '#shared/stats/theil-sen-slope';
import { xmrLimits } from '#shared/stats/xmr-limits';

/** Billed weeks that limits are made from, at most and at least (rule 5). */
const BASELINE = 26;
const LEAST = 8;

export interface MarginQuestion {
  period: Period;
  filters: JobFilters;
  /** The latest local date in scope: a week is over when its Sunday has passed (rule 7). */
  today: string;
  targetMarginShare: number | null;
}

/** The weekly margins of a scope with limits, signals, trend and the bridge; one snapshot of the database. */
export function answerMargin(db: ScopedDb, question: MarginQuestion): MarginAnswer {
  return db.snapshot(() => {
    const { period, targetMarginShare } = question;
    const filters = { ...question.filters, ...period };
    const sums = new Map(sumWeeks(db, filters).map((week) => [week.week, week]));
    const weeks = weeksTouching(period.from, period.to).map((week) =>
      weekOf(week, sums.get(week), question),
    );
    const billed = weeks.filter(isBilledWhole);
    const limits = limitsOf(db, question, billed);
    mark(billed, limits);
    const all = [...sums.values()];
    return {
      period,
      scope: db.scope.echo(),
      jobs: total(all, 'jobs'),
      withoutCost: total(all, 'withoutCost'),
      missingCosts: listMissingCosts(db, filters),
      weeks,
      limits,
      trend: trendOf(billed),
      bridge: bridgeOf(all),
      targetMarginShare,
    };
  });
}

type Billed = MarginWeek & { marginShare: number };

function isBilledWhole(week: MarginWeek): week is Billed {
  return week.whole && week.marginShare !== null;
}

function weekOf(
  week: string,
  sums: WeekSums | undefined,
  { period, today }: MarginQuestion,
): MarginWeek {
  const monday = mondayOfWeek(week);
  const sunday = addDays(monday, 6);
  const { marginCents, expectedMarginCents } = margins(sums);
  const revenueCents = sums?.revenueCents ?? 0;
  return {
    week,
    jobs: sums?.jobs ?? 0,
    unbilled: sums?.unbilled ?? 0,
    unbilledCostCents: sums?.unbilledCostCents ?? 0,
    revenueCents,
    labourCents: sums?.labourCents ?? 0,
    productCents: sums?.productCents ?? 0,
    consumablesCents: sums?.consumablesCents ?? 0,
    boughtInCents: sums?.boughtInCents ?? 0,
    feeCents: sums?.feeCents ?? 0,
    marginCents,
    // A billed week has revenue; without any there is no share (rule 4).
    marginShare: revenueCents > 0 ? marginCents / revenueCents : null,
    expectedMarginCents,
    signal: null,
    whole: monday >= period.from && sunday <= period.to && sunday < today,
  };
}

function margins(sums: WeekSums | undefined): {
  marginCents: number;
  expectedMarginCents: number;
} {
  if (!sums) return { marginCents: 0, expectedMarginCents: 0 };
  return {
    marginCents:
      sums.revenueCents -
      sums.labourCents -
      sums.productCents -
      sums.consumablesCents -
      sums.boughtInCents -
      sums.feeCents,
    expectedMarginCents:
      sums.expPriceCents -
      sums.expLabourCents -
      sums.expRepairCents -
      sums.expProductCents -
      sums.expFeeCents,
  };
}

/** Limits from the billed whole weeks immediately before the last one of the period (rule 5). */
function limitsOf(
  db: ScopedDb,
  { period, filters }: MarginQuestion,
  billed: readonly Billed[],
): MarginAnswer['limits'] {
  if (billed.length === 0) return null;
  const within = billed.slice(0, -1).slice(-BASELINE);
  const missing = BASELINE - within.length;
  const earlier = missing > 0 ? listEarlierWeeks(db, period.from, filters, missing).reverse() : [];
  const baseline = [
    ...earlier.map((week) => week.marginCents / week.revenueCents),
    ...within.map((week) => week.marginShare),
  ];
  if (baseline.length < LEAST) return null;
  const limits = xmrLimits(baseline);
  if (!limits) return null;
  const { centre, lower, upper } = limits;
  return { centre, lower, upper, baselineWeeks: baseline.length };
}

/** Marks the weeks outside the limits and in runs (rule 6). */
function mark(billed: readonly Billed[], limits: MarginAnswer['limits']): void {
  const signals = chartSignals(
    billed.map((week) => week.marginShare),
    limits ?? undefined,
  );
  billed.forEach((week, index) => {
    week.signal = signals[index] ?? null;
  });
}

/** Slope in calendar weeks and its Mann–Kendall p over the billed whole weeks (rule 41). */
function trendOf(billed: readonly Billed[]): MarginAnswer['trend'] {
  if (billed.length < LEAST) return null;
  const values = billed.map((week) => week.marginShare);
  const times = billed.map((week) => dayNumber(mondayOfWeek(week.week)) / 7);
  const slopePerWeek = theilSenSlope(times, values);
  const test = mannKendall(values);
  if (slopePerWeek === undefined || !test) return null;
  return { slopePerWeek, p: test.p };
}

/** The bridge over all jobs that have an expectation; its steps add up to the cent (rules 2 and 3). */
function bridgeOf(weeks: readonly WeekSums[]): Bridge {
  const sum = (key: Exclude<keyof WeekSums, 'week'>): number => total(weeks, key);
  const expectedMarginCents =
    sum('expPriceCents') -
    sum('expLabourCents') -
    sum('expRepairCents') -
    sum('expProductCents') -
    sum('expFeeCents');
  const steps = {
    priceCents: sum('actRevenueCents') - sum('expPriceCents'),
    plannedLabourCents: sum('expLabourCents') - sum('actLabourCents'),
    rotLabourCents: sum('expRepairCents') - sum('actRepairCents'),
    productCents: sum('expProductCents') - sum('actProductCents'),
    consumablesCents: 0 - sum('actConsumablesCents'),
    feeCents: sum('expFeeCents') - sum('actFeeCents'),
  };
  return {
    cars: sum('bridgeCars'),
    expectedMarginCents,
    ...steps,
    marginCents:
      sum('actRevenueCents') -
      sum('actLabourCents') -
      sum('actRepairCents') -
      sum('actProductCents') -
      sum('actConsumablesCents') -
      sum('actFeeCents'),
  };
}

function total(weeks: readonly WeekSums[], key: Exclude<keyof WeekSums, 'week'>): number {
  return weeks.reduce((all, week) => all + week[key], 0);
}
