import { readCostsOfDay, type CostsOfDay } from '#db/queries/costs-of-day';
import type { JobFilters } from '#db/queries/job-filters';
import {
  countBookings,
  countBranchCells,
  countBranchWeeks,
  listBranchLives,
  sumBranchCells,
  type BranchLife,
} from '#db/queries/product-need';
import { productCodes, readNorms } from '#db/queries/products';
import type { ScopedDb } from '#db/scoped-db';
import type { ProductNeed, ProductNeedAnswer } from '#shared/contracts/products';
import { addDays, daysBetween, isoWeek, mondayOf, weeksTouching } from '#shared/domain/calendar';
import type { Period } from '#shared/domain/period';
import type { MeanAndVariance } from '#shared/stats/compound-sum';
import { Z_95 } from '#shared/stats/normal-distribution';
import { branchNeed, type BranchNeed, type NeedKind } from './branch-need';
import { kindKey, useACar, type NeedCell } from './use-a-car';
import { usualCars } from './usual-cars';

/** What is asked of the coming weeks' need. */
export interface NeedQuestion {
  period: Period;
  filters: JobFilters;
  today: string;
}

/** How far the forecast looks. */
const WEEKS = 8;

/**
 * Product that the eight whole weeks after this one are expected to take; one snapshot of the database.
 *
 * Branch by branch: its usual number of cars a week is the mean over the whole weeks of the period that are over, from the week of
 * its first job on and until it closed. A coming week has the cars in its diary and, while those are fewer than usual, stand-ins
 * up to the usual number in the branch's usual mix of packages and body types. Each car takes what the branch's own cars of its
 * package and body type took on average, or the norm where there are fewer than 5 of them; a car of neither is left out and
 * counted. The range is the expected amount ± 1.96 standard errors, from 0 up, taking branches as independent of each other; what it
 * cannot know is a change of season, of staff or of the norm.
 */
export function answerProductNeed(db: ScopedDb, question: NeedQuestion): ProductNeedAnswer {
  return db.snapshot(() => {
    const { period, today } = question;
    const coming = comingDays(today);
    const { jobs, branches } = readBranches(db, question, coming);
    const totals = new Map<number, MeanAndVariance>();
    for (const { products } of branches) {
      for (const [product, { mean, variance }] of products) {
        const all = totals.get(product) ?? { mean: 0, variance: 0 };
        totals.set(product, { mean: all.mean + mean, variance: all.variance + variance });
      }
    }
    const needs = needsOf(totals, productCodes(db), readCostsOfDay(db, today));
    return {
      period,
      scope: db.scope.echo(),
      jobs,
      coming,
      weeks: weeksTouching(coming.from, coming.to).map((week, index) => ({
        week,
        booked: sum(branches.map((branch) => branch.bookedByWeek[index] ?? 0)),
        usual: sum(branches.map((branch) => branch.standIns[index] ?? 0)),
      })),
      needs,
      carsWithoutUse: sum(branches.map((branch) => branch.carsWithoutUse)),
      missingCosts: needs
        .filter(({ costCents }) => costCents === null)
        .map(({ product }) => ({ product, on: today })),
    };
  });
}

/** The whole weeks after the one of a day. */
function comingDays(today: string): Period {
  const from = addDays(mondayOf(today), 7);
  return { from, to: addDays(from, 7 * WEEKS - 1) };
}

/** The need of every branch that has had or expects a car. */
function readBranches(
  db: ScopedDb,
  { period, filters, today }: NeedQuestion,
  coming: Period,
): { jobs: number; branches: (BranchNeed & { bookedByWeek: number[] })[] } {
  const asked = { ...filters, ...period };
  const cells = countBranchCells(db, asked);
  const findUse = useACar(cells, sumBranchCells(db, asked), readNorms(db));
  const bookings = countBookings(db, coming, filters);
  const weekly = readWeekly(db, filters, wholeWeeks(period, today));
  const branches = listBranchLives(db).map((life) => {
    const bookedByWeek = Array<number>(WEEKS).fill(0);
    const kinds = new Map<string, NeedKind>();
    const kindOf = (cell: NeedCell): NeedKind =>
      kinds.get(kindKey(cell)) ?? { past: 0, booked: 0, use: findUse(cell) };
    for (const cell of cells) {
      if (cell.branchId !== life.branchId) continue;
      kinds.set(kindKey(cell), { ...kindOf(cell), past: cell.cars });
    }
    for (const { on, cars, ...cell } of bookings) {
      if (cell.branchId !== life.branchId) continue;
      const kind = kindOf(cell);
      kinds.set(kindKey(cell), { ...kind, booked: kind.booked + cars });
      const week = Math.floor(daysBetween(coming.from, on) / 7);
      bookedByWeek[week] = (bookedByWeek[week] ?? 0) + cars;
    }
    const usual = usualCars(weekly(life));
    const open = bookedByWeek.map((_, week) => isOpen(life, addDays(coming.from, 7 * week)));
    return {
      bookedByWeek,
      ...branchNeed({ bookedByWeek, open, usual, kinds: [...kinds.values()] }),
    };
  });
  return { jobs: sum(cells.map(({ cars }) => cars)), branches };
}

/** The days of the whole weeks of a period that are over, or `undefined` when it has none (rule 7). */
function wholeWeeks({ from, to }: Period, today: string): Period | undefined {
  const first = mondayOf(addDays(from, 6));
  const afterLast = mondayOf(addDays(to < today ? to : addDays(today, -1), 1));
  return first < afterLast ? { from: first, to: addDays(afterLast, -1) } : undefined;
}

/** How many cars a branch had in each whole week of its life, weeks of none among them. */
function readWeekly(
  db: ScopedDb,
  filters: JobFilters,
  days: Period | undefined,
): (life: BranchLife) => number[] {
  if (!days) return () => [];
  const counts = new Map(
    countBranchWeeks(db, { ...filters, ...days }).map(({ branchId, week, cars }) => [
      `${branchId} ${week}`,
      cars,
    ]),
  );
  const mondays = weeksTouching(days.from, days.to).map((_, index) =>
    addDays(days.from, 7 * index),
  );
  return (life) => {
    const { branchId, firstOn } = life;
    if (firstOn === null) return [];
    return mondays
      .filter((monday) => addDays(monday, 6) >= firstOn && isOpen(life, monday))
      .map((monday) => counts.get(`${branchId} ${isoWeek(monday)}`) ?? 0);
  };
}

/** Whether a branch had not closed when a week began. */
function isOpen({ closedOn }: BranchLife, monday: string): boolean {
  return closedOn === null || monday < closedOn;
}

function needsOf(
  totals: ReadonlyMap<number, MeanAndVariance>,
  codes: ReadonlyMap<number, string>,
  { litreCents }: CostsOfDay,
): ProductNeed[] {
  return [...totals]
    .filter(([, { mean }]) => mean > 0)
    .map(([id, { mean, variance }]) => {
      const product = codes.get(id) ?? '';
      const reach = Z_95 * Math.sqrt(variance);
      const cost = litreCents.get(product);
      return {
        product,
        ml: mean,
        lowerMl: Math.max(0, mean - reach),
        upperMl: mean + reach,
        costCents: cost === undefined ? null : Math.floor((mean * cost) / 1000 + 0.5),
      };
    })
    .sort((a, b) => (a.product < b.product ? -1 : 1));
}

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
