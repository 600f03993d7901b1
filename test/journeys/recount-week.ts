import { addDays, formatISO, getISOWeek, getISOWeekYear, parseISO } from 'date-fns';
import { STEPS, type CountedCar, type Step } from './recount';

/** How many billed weeks the limits come from at most, and how many they take at least (rules 5 and 6). */
const BASELINE = 26;
const FEWEST = 8;
/** Weeks drawn before the chosen one; a run is counted from the first of them. */
const DRAWN_BEFORE = 26;

/** A week of some branches, counted from their cars. */
export interface CountedWeek {
  /** ISO number of the week. */
  number: number;
  year: number;
  billed: number;
  revenue: bigint;
  kept: bigint;
  limits: { lower: number; centre: number; upper: number; weeks: number } | undefined;
  /** Consecutive billed weeks on this week's side of the centre, itself included. */
  running: number;
  bridge: { cars: number; expected: bigint; kept: bigint; steps: Record<Step, bigint> };
  /** Cars finished by the end of the week and not billed, whenever that was. */
  unbilled: number;
}

/** Counts the week that begins on a Monday: what it kept, what is usual by the weeks before it, what moved it. */
export function recountWeek(cars: readonly CountedCar[], monday: string): CountedWeek {
  const sunday = dayAfter(monday, 6);
  const own = cars.filter((car) => car.billed && within(car, monday, sunday));
  const bridged = own.filter((car) => car.bridge);
  const shares = sharesBefore(cars, monday);
  const limits = limitsOf(shares.slice(-BASELINE).map(({ share }) => share));
  const start = dayAfter(monday, -7 * DRAWN_BEFORE);
  const now = shareOf(own);
  const drawn = [
    ...shares.filter(({ from }) => from >= start).map(({ share }) => share),
    ...(now === undefined ? [] : [now]),
  ];
  return {
    number: getISOWeek(parseISO(monday)),
    year: getISOWeekYear(parseISO(monday)),
    billed: own.length,
    revenue: total(own.map(({ revenue }) => revenue)),
    kept: total(own.map(({ kept }) => kept)),
    limits,
    running: limits ? runningOf(drawn, limits.centre) : 0,
    bridge: {
      cars: bridged.length,
      expected: total(bridged.map(({ bridge }) => bridge!.expected)),
      kept: total(bridged.map(({ kept }) => kept)),
      steps: Object.fromEntries(
        STEPS.map((step) => [step, total(bridged.map(({ bridge }) => bridge![step]))]),
      ) as Record<Step, bigint>,
    },
    unbilled: cars.filter((car) => !car.billed && car.completedOn <= sunday).length,
  };
}

/** The step that moved the week most either way, the first told of equals. */
export function largestOf(steps: Record<Step, bigint>): { step: Step; cents: bigint } {
  const size = (cents: bigint): bigint => (cents < 0n ? -cents : cents);
  return STEPS.map((step) => ({ step, cents: steps[step] })).reduce((largest, one) =>
    size(one.cents) > size(largest.cents) ? one : largest,
  );
}

/** Share kept of every billed week before a Monday, oldest first; weeks without a bill are passed over. */
function sharesBefore(
  cars: readonly CountedCar[],
  monday: string,
): { from: string; share: number }[] {
  const weeks: { from: string; share: number }[] = [];
  const oldest = cars.reduce(
    (first, { completedOn }) => (completedOn < first ? completedOn : first),
    monday,
  );
  const first = dayAfter(oldest, -6);
  for (let from = dayAfter(monday, -7); from >= first; from = dayAfter(from, -7)) {
    const to = dayAfter(from, 6);
    const share = shareOf(cars.filter((car) => car.billed && within(car, from, to)));
    if (share !== undefined) weeks.unshift({ from, share });
    if (weeks.length === 2 * BASELINE) break;
  }
  return weeks;
}

function shareOf(billed: readonly CountedCar[]): number | undefined {
  const revenue = total(billed.map((car) => car.revenue));
  return revenue > 0n ? Number(total(billed.map(({ kept }) => kept))) / Number(revenue) : undefined;
}

function limitsOf(shares: number[]): CountedWeek['limits'] {
  if (shares.length < FEWEST) return undefined;
  const centre = mean(shares);
  const moves = shares.slice(1).map((share, index) => Math.abs(share - shares[index]!));
  const reach = (3 / 1.128) * mean(moves);
  return { lower: centre - reach, centre, upper: centre + reach, weeks: shares.length };
}

function runningOf(shares: number[], centre: number): number {
  const sides = shares.map((share) => Math.sign(share - centre));
  const side = sides.at(-1);
  if (!side) return 0;
  const before = sides.findLastIndex((one) => one !== side);
  return sides.length - 1 - before;
}

function within({ completedOn }: CountedCar, from: string, to: string): boolean {
  return completedOn >= from && completedOn <= to;
}

function dayAfter(date: string, days: number): string {
  return formatISO(addDays(parseISO(date), days), { representation: 'date' });
}

function mean(values: number[]): number {
  return values.reduce((all, one) => all + one, 0) / values.length;
}

function total(values: bigint[]): bigint {
  return values.reduce((all, one) => all + one, 0n);
}
