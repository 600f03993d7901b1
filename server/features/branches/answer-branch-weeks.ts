import { readBranchWeeks, type BranchWeekSums } from '#db/queries/branch-weeks';
import { countCosted } from '#db/queries/count-costed';
import { readTargets } from '#db/queries/targets';
import { readClaimsOnCars, readCoverByBranch } from '#db/queries/warranty';
import { whereJobs } from '#db/queries/job-filters';
import type { ScopedDb } from '#db/scoped-db';
import type { BranchWeeks, BranchWeeksAnswer } from '#shared/contracts/branches';
import { carsUnderCover, claimsByStretch, countedClaims } from '#shared/domain/claims-by-week';
import { addDays, mondayOf, mondayOfWeek, weeksTouching } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { BASELINE_WEEKS, usualRange } from '#shared/domain/usual-range';
import type { BranchMeasure } from '#shared/domain/vocabulary';
import { CoverBook } from '#shared/domain/warranty-cover';
import { chartSignals } from '#shared/stats/chart-signals';
import type { BranchesQuestion } from './place-branches';

/** A week of the period: its days in it, and whether all of them are and are over (rule 7). */
interface AskedWeek extends Period {
  week: string;
  whole: boolean;
}

type Summed = Exclude<BranchMeasure, 'claims'>;

/** Each branch's weeks in a measure with the usual range of its own (rules 5 to 7); one snapshot of the database. */
export function answerBranchWeeks(db: ScopedDb, question: BranchesQuestion): BranchWeeksAnswer {
  return db.snapshot(() => {
    const { measure, period, filters } = question;
    const weeks = weeksOf(question);
    const targets = readTargets(db);
    const told =
      measure === 'claims'
        ? claimWeeks(db, question, weeks)
        : measuredWeeks(db, question, measure, weeks);
    return {
      period,
      scope: db.scope.echo(),
      jobs: countCosted(db, { ...filters, ...period }).jobs,
      measure,
      branches: db.scope.branches.flatMap(({ id, code }) => {
        const own = told.get(id);
        return own ? [{ branch: code, ...own, target: targets.branch(id, measure) }] : [];
      }),
    };
  });
}

type ToldWeeks = Pick<BranchWeeks, 'weeks' | 'limits'>;

function measuredWeeks(
  db: ScopedDb,
  { period, filters }: BranchesQuestion,
  measure: Summed,
  weeks: readonly AskedWeek[],
): Map<number, ToldWeeks> {
  const within = byBranch(readBranchWeeks(db, measure, { ...filters, ...period }));
  // The week that `from` cuts takes no part, so weeks before the period end before its Monday (rule 7).
  const to = addDays(mondayOf(period.from), -1);
  const before = byBranch(readBranchWeeks(db, measure, { ...filters, to }));
  return new Map(
    [...within].map(([id, sums]) => {
      const earlier = (before.get(id) ?? []).flatMap((one) => valueOf(measure, one) ?? []);
      return [id, judged(measure, weeks, sums, earlier)];
    }),
  );
}

/** The weeks of one branch with limits from up to 26 before its last one (rule 5) and what each says of them (rule 6). */
function judged(
  measure: Summed,
  weeks: readonly AskedWeek[],
  sums: readonly BranchWeekSums[],
  earlier: readonly number[],
): ToldWeeks {
  const known = new Map(sums.map((one) => [one.week, one]));
  const told = weeks.map(({ week, whole }) => {
    const own = known.get(week);
    return { week, whole, cars: own?.cars ?? 0, value: own ? valueOf(measure, own) : null };
  });
  const values = told.flatMap(({ whole, value }) => (whole && value !== null ? [value] : []));
  const limits =
    values.length === 0
      ? null
      : usualRange([...earlier, ...values.slice(0, -1)].slice(-BASELINE_WEEKS));
  const signals = chartSignals(values, limits ?? undefined);
  let judgedSoFar = 0;
  return {
    limits,
    weeks: told.map(({ week, whole, cars, value }) => {
      const isJudged = whole && value !== null;
      return { week, cars, value, signal: isJudged ? (signals[judgedSoFar++] ?? null) : null };
    }),
  };
}

/** A ratio of sums; below five cars only of margin (rule 13), and none where nothing divides. */
function valueOf(measure: Summed, { cars, a, e }: BranchWeekSums): number | null {
  return e > 0 && (measure === 'margin' || cars >= FEWEST_CARS) ? a / e : null;
}

/** Claims made in each week; a branch that has a car under warranty in one of them has a row. */
function claimWeeks(
  db: ScopedDb,
  { filters, today }: BranchesQuestion,
  weeks: readonly AskedWeek[],
): Map<number, ToldWeeks> {
  const asked = readClaimsOnCars(db, filters, today);
  const made = claimsByStretch(countedClaims(asked, new CoverBook(today), today), weeks);
  const sold = readCoverByBranch(db, whereJobs(db.table('job_facts'), filters));
  return new Map(
    sold.flatMap(({ branchId, ...lists }): [number, ToldWeeks][] => {
      const cars = carsUnderCover(lists, weeks, today);
      const claims = weeks.map((_, place) => made.get(branchId)?.[place]?.length ?? 0);
      if (![...cars, ...claims].some((count) => count > 0)) return [];
      const told = weeks.map(({ week }, place) => ({
        week,
        cars: cars[place] ?? 0,
        value: (cars[place] ?? 0) > 0 ? (claims[place] ?? 0) : null,
        signal: null,
      }));
      return [[branchId, { limits: null, weeks: told }]];
    }),
  );
}

function weeksOf({ period, today }: BranchesQuestion): AskedWeek[] {
  return weeksTouching(period.from, period.to).map((week) => {
    const monday = mondayOfWeek(week);
    const sunday = addDays(monday, 6);
    return {
      week,
      from: monday < period.from ? period.from : monday,
      to: sunday > period.to ? period.to : sunday,
      whole: monday >= period.from && sunday <= period.to && sunday < today,
    };
  });
}

function byBranch(rows: readonly BranchWeekSums[]): Map<number, BranchWeekSums[]> {
  const branches = new Map<number, BranchWeekSums[]>();
  for (const row of rows) branches.set(row.branchId, [...(branches.get(row.branchId) ?? []), row]);
  return branches;
}
