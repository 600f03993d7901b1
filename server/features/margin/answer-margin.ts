import { listBilledWeeks, listMissingCosts, sumSpans } from '#db/queries/margin';
import { readMarginTarget } from '#db/queries/margin-target';
import type { JobFilters } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { MarginAnswer, MarginWeek } from '#shared/contracts/margin';
import { bridgeOf } from '#shared/domain/bridge';
import { addDays, mondayOf, mondayOfWeek, weeksTouching } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import { BASELINE_WEEKS, usualRange } from '#shared/domain/usual-range';
import { isJudged, markSignals, trendOf, type BilledWeek } from './judge-weeks';
import { addSums, noMoney, tellWeek, type MoneyOfJobs } from './week-figures';

export interface MarginQuestion {
  period: Period;
  filters: JobFilters;
  /** The latest local date in scope: a week is over when its Sunday has passed (rule 7). */
  today: string;
}

/** The weekly margins of a scope with limits, signals, trend and the bridge; one snapshot of the database. */
export function answerMargin(db: ScopedDb, question: MarginQuestion): MarginAnswer {
  return db.snapshot(() => {
    const { period, filters } = question;
    const { weeks, total } = readWeeks(db, question);
    const judged = weeks.filter(isJudged);
    const limits = usualRange(baselineOf(db, judged, question));
    markSignals(judged, limits);
    return {
      period,
      scope: db.scope.echo(),
      jobs: total.jobs,
      withoutCost: total.withoutCost,
      missingCosts: total.wanting > 0 ? listMissingCosts(db, { ...filters, ...period }) : [],
      weeks,
      limits,
      trend: trendOf(judged),
      bridge: {
        cars: total.bridged.cars,
        ...bridgeOf(total.bridged.actual, total.bridged.expected),
      },
      targetMarginShare: readMarginTarget(db),
    };
  });
}

/** Every week that touches the period, with what happened on its days in the period, and the whole period's money. */
function readWeeks(
  db: ScopedDb,
  { period, filters, today }: MarginQuestion,
): { weeks: MarginWeek[]; total: MoneyOfJobs } {
  const names = weeksTouching(period.from, period.to);
  const spans = names.map((name) => daysOf(name, period));
  const total = noMoney();
  const money = names.map(noMoney);
  for (const sums of sumSpans(db, spans, filters)) {
    addSums(money[sums.span] as MoneyOfJobs, sums);
    addSums(total, sums);
  }
  const weeks = names.map((name, index) => {
    const { from, to } = spans[index] as Period;
    const monday = mondayOfWeek(name);
    const sunday = addDays(monday, 6);
    const whole = from === monday && to === sunday && sunday < today;
    return tellWeek(name, money[index] as MoneyOfJobs, whole);
  });
  return { weeks, total };
}

function daysOf(week: string, { from, to }: Period): Period {
  const monday = mondayOfWeek(week);
  const sunday = addDays(monday, 6);
  return { from: monday < from ? from : monday, to: sunday > to ? to : sunday };
}

/** Margin shares of the up to 26 billed weeks immediately before the last one, oldest first; none without a last one (rule 5). */
function baselineOf(
  db: ScopedDb,
  judged: readonly BilledWeek[],
  { period, filters }: MarginQuestion,
): number[] {
  if (judged.length === 0) return [];
  const within = judged.slice(0, -1).slice(-BASELINE_WEEKS);
  // The week that `from` cuts takes no part, so weeks before the period end before its Monday (rule 7).
  const before = earlierShares(db, mondayOf(period.from), filters, BASELINE_WEEKS - within.length);
  return [...before, ...within.map((week) => week.marginShare)];
}

/** Margin shares of the last billed weeks before a Monday, oldest first. */
function earlierShares(
  db: ScopedDb,
  monday: string,
  filters: JobFilters,
  wanted: number,
): number[] {
  const shares: number[] = [];
  // Most branches bill every week: a look at twice the weeks wanted nearly always saves a look at all of history.
  const near = addDays(monday, -14 * wanted);
  for (const [from, to] of [
    [near, addDays(monday, -1)],
    [undefined, addDays(near, -1)],
  ]) {
    if (shares.length >= wanted) break;
    const weeks = listBilledWeeks(db, { ...filters, from, to }, wanted - shares.length);
    shares.push(...weeks.map((week) => week.marginCents / week.revenueCents));
  }
  return shares.reverse();
}
