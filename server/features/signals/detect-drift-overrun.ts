import { addDays, dayNumber } from '#shared/domain/calendar';
import type { FactsByKind } from '#shared/domain/signal-facts';
import { tabularCusum } from '#shared/stats/cusum';
import { plainSignal, type FoundSignal } from './found-signal';

/** Weeks that are judged, and the weeks before them that say what is usual: a year, so that every season is in it. */
export const JUDGED_WEEKS = 26;
export const USUAL_WEEKS = 52;
/** Fewer usual weeks with cars, or cars in them, say nothing of what is usual. */
const FEWEST_WEEKS = 26;
const FEWEST_CARS = 100;
/** Half of the shift that is to be found soonest, one σ of a branch's week: the usual choice. */
const K = 0.5;
/** Where the sum tells of a drift: chosen by simulation (see `false-alarms.md`), higher than the usual 5 because the target is estimated. */
const H = 6;
/** An own cell is drawn towards the branch's overall ratio as if it had this many cars more: some cells hold two or three. */
const CELL_WEIGHT = 10;

/** Estimated cars of a branch, one place a car in every list. */
export interface TimedCars {
  branchId: number;
  refs: readonly string[];
  completedOn: readonly string[];
  /** Package and age band as one number. */
  cells: readonly number[];
  estimated: readonly number[];
  actual: readonly number[];
}

/**
 * Tabular CUSUM on the weekly minutes beyond what the same cars usually take at that branch, package and age band allowed
 * for, in σ of such a week; `monday` begins the week after the last one judged. Only upward: work that takes ever less is
 * no loss to notice in time, and the funnel tells of it. One number a week, so looking every night changes nothing.
 *
 * Source of the method: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3.
 */
export function detectDriftOverrun(cars: TimedCars, monday: string): FoundSignal[] {
  const first = addDays(monday, -7 * (USUAL_WEEKS + JUDGED_WEEKS));
  const begin = dayNumber(first);
  const weekOf = cars.completedOn.map((day) => Math.floor((dayNumber(day) - begin) / 7));
  const isUsual = (car: number): boolean => weekOf[car]! >= 0 && weekOf[car]! < USUAL_WEEKS;
  const rates = usualRates(cars, isUsual);
  if (!rates) return [];
  const weeks = Array.from({ length: USUAL_WEEKS + JUDGED_WEEKS }, () => ({ cars: 0, beyond: 0 }));
  weekOf.forEach((at, car) => {
    const week = weeks[at];
    if (!week) return;
    week.cars += 1;
    week.beyond += cars.actual[car]! - rates(cars.cells[car]!) * cars.estimated[car]!;
  });
  const usual = weeks.slice(0, USUAL_WEEKS).filter((week) => week.cars > 0);
  if (usual.length < FEWEST_WEEKS) return [];
  // Of one car, from whole weeks: what makes the cars of a week alike is part of it.
  const variance =
    usual.reduce((sum, week) => sum + week.beyond ** 2 / week.cars, 0) / usual.length;
  if (!(variance > 0)) return [];
  const judged = weeks
    .map((week, at) => ({ ...week, at }))
    .slice(USUAL_WEEKS)
    .filter((week) => week.cars > 0);
  const values = judged.map((week) => week.beyond / Math.sqrt(variance * week.cars));
  const { high } = tabularCusum(values, { target: 0, k: K, h: H });
  const sum = high.at(-1) ?? 0;
  // It stays until half of it is worked off, or it would come and go.
  if (sum <= H / 2) return [];
  const begun = judged[high.findLastIndex((value) => value === 0) + 1]!.at;
  return [toldDrift(cars, weekOf, begun, rates, sum, first)];
}

/** Actual over estimated minutes that are usual in each cell; undefined with too few cars. */
function usualRates(
  cars: TimedCars,
  isUsual: (car: number) => boolean,
): ((cell: number) => number) | undefined {
  const cells = new Map<number, { estimated: number; actual: number }>();
  const all = { cars: 0, estimated: 0, actual: 0 };
  cars.cells.forEach((key, car) => {
    if (!isUsual(car)) return;
    const cell = cells.get(key) ?? { estimated: 0, actual: 0 };
    cell.estimated += cars.estimated[car]!;
    cell.actual += cars.actual[car]!;
    cells.set(key, cell);
    all.cars += 1;
    all.estimated += cars.estimated[car]!;
    all.actual += cars.actual[car]!;
  });
  if (all.cars < FEWEST_CARS) return undefined;
  const overall = all.actual / all.estimated;
  const weight = (CELL_WEIGHT * all.estimated) / all.cars;
  return (key) => {
    const { estimated, actual } = cells.get(key) ?? { estimated: 0, actual: 0 };
    return (actual + weight * overall) / (estimated + weight);
  };
}

function toldDrift(
  cars: TimedCars,
  weekOf: readonly number[],
  begun: number,
  rates: (cell: number) => number,
  sum: number,
  first: string,
): FoundSignal {
  const behind = weekOf.flatMap((week, car) =>
    week >= begun && week < USUAL_WEEKS + JUDGED_WEEKS ? [car] : [],
  );
  const total = (value: (car: number) => number): number =>
    behind.reduce((all, car) => all + value(car), 0);
  const estimated = total((car) => cars.estimated[car]!);
  const facts: FactsByKind['drift_overrun'] = {
    ratio: total((car) => cars.actual[car]!) / estimated,
    usualRatio: total((car) => rates(cars.cells[car]!) * cars.estimated[car]!) / estimated,
    weeks: USUAL_WEEKS + JUDGED_WEEKS - begun,
  };
  const beyond = (car: number): number =>
    cars.actual[car]! - rates(cars.cells[car]!) * cars.estimated[car]!;
  const most = [...behind].sort((a, b) => beyond(b) - beyond(a));
  return {
    ...plainSignal({
      branchId: cars.branchId,
      kind: 'drift_overrun',
      key: 'up',
      since: addDays(first, 7 * begun),
      strength: sum / H,
      facts: { ...facts },
      cars: behind.length,
      listed: most.map((car) => ({
        ref: cars.refs[car]!,
        why: `${Math.round(cars.actual[car]!)} minutes for ${cars.estimated[car]!} estimated`,
      })),
    }),
    weight: sum > H ? 'open' : 'keep',
  };
}
