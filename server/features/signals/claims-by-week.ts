import type { ClaimRow, WarrantyCars } from '#db/queries/warranty';
import { addDays, dayNumber, daysBetween } from '#shared/domain/calendar';
import { claimStanding } from '#shared/domain/claim-standing';
import {
  CoverBook,
  monthInService,
  yearInService,
  type Cover,
} from '#shared/domain/warranty-cover';
import type { ClaimWeeks } from './detect-drift-claims';

/** How many claims as expected a calendar month is drawn towards no season by. */
const SEASON_WEIGHT = 20;

/**
 * Each branch's counted claims by the week they were made, and those expected of its days under warranty: the network's
 * rates by package, age band and year in service (rule 20) over all its history, times how much the network has of them in
 * that calendar month, for most claims come in a second winter. Weeks end before `end`, a Monday.
 */
export function claimsByWeek(
  cars: WarrantyCars,
  claims: readonly ClaimRow[],
  refOf: (jobId: number) => string,
  { end, weeks, today }: { end: string; weeks: number; today: string },
): ClaimWeeks[] {
  const monday = addDays(end, -7 * weeks);
  const covers = coversOf(cars, today);
  const counted = countedClaims(claims, covers, today);
  const rates = ratesOf(covers, counted);
  const season = seasonOf(covers, counted, rates);
  const first = dayNumber(monday);
  const byBranch = new Map<number, ClaimWeeks & { claims: { ref: string; madeOn: string }[][] }>();
  const days = new Map<number, Float64Array>();
  for (const cover of covers) {
    if (!days.has(cover.branchId)) days.set(cover.branchId, new Float64Array(7 * weeks + 1));
    eachStretch(cover, (from, to, key) => {
      const [a, b] = [clamp(from - first, 7 * weeks), clamp(to - first, 7 * weeks)];
      const steps = days.get(cover.branchId)!;
      steps[a]! += rates.get(key) ?? 0;
      steps[b]! -= rates.get(key) ?? 0;
    });
  }
  for (const [branchId, steps] of days) {
    const expected = Array.from({ length: weeks }, () => 0);
    let rate = 0;
    for (let day = 0; day < 7 * weeks; day += 1) {
      rate += steps[day]!;
      expected[Math.floor(day / 7)]! += rate * season[monthOf(addDays(monday, day))]!;
    }
    const empty = Array.from({ length: weeks }, (): { ref: string; madeOn: string }[] => []);
    byBranch.set(branchId, { branchId, monday, claims: empty, expected });
  }
  for (const { branchId, jobId, madeOn } of counted) {
    const week = Math.floor(daysBetween(monday, madeOn) / 7);
    byBranch.get(branchId)?.claims[week]?.push({ ref: refOf(jobId), madeOn });
  }
  return [...byBranch.values()].sort((a, b) => a.branchId - b.branchId);
}

/** A car under warranty. */
interface CoveredCar extends Cover {
  branchId: number;
  jobId: number;
  begun: number;
  /** Package and age band as one number. */
  sold: number;
  completedOn: string;
}

interface CountedClaim {
  branchId: number;
  jobId: number;
  madeOn: string;
  key: number;
}

/** More than any warranty has years. */
const YEARS = 100;

function coversOf(cars: WarrantyCars, today: string): CoveredCar[] {
  const book = new CoverBook(today);
  return cars.completedOn.flatMap((completedOn, car) => {
    if (completedOn > today) return [];
    const cover = book.coverOf(completedOn, cars.warrantyMonths[car]!);
    if (!cover) return [];
    return {
      ...cover,
      completedOn,
      branchId: cars.branchIds[car]!,
      jobId: cars.jobIds[car]!,
      begun: dayNumber(completedOn) + 1,
      sold: 8 * cars.packageIds[car]! + cars.bands[car]!,
    };
  });
}

function countedClaims(
  claims: readonly ClaimRow[],
  covers: readonly CoveredCar[],
  today: string,
): CountedClaim[] {
  const byJob = new Map(covers.map((cover) => [cover.jobId, cover]));
  return claims.flatMap((claim) => {
    const cover = byJob.get(claim.jobId);
    if (!cover || claimStanding(claim, cover.end, today) !== 'counted') return [];
    const { branchId, jobId, sold, completedOn } = cover;
    const year = yearInService(monthInService(completedOn, claim.madeOn));
    return { branchId, jobId, madeOn: claim.madeOn, key: sold * YEARS + year - 1 };
  });
}

/** Calls for each stretch of a car's days under cover in one year of service: first day, the day after its last, its cell. */
function eachStretch(
  { begun, daysByYear, sold }: CoveredCar,
  call: (from: number, to: number, key: number) => void,
): void {
  let from = begun;
  daysByYear.forEach((length, year) => {
    call(from, from + length, sold * YEARS + year);
    from += length;
  });
}

/** Claims a day of cover in each cell over the whole network and all its history. */
function ratesOf(
  covers: readonly CoveredCar[],
  counted: readonly CountedClaim[],
): Map<number, number> {
  const days = new Map<number, number>();
  for (const cover of covers) {
    eachStretch(cover, (from, to, key) => days.set(key, (days.get(key) ?? 0) + to - from));
  }
  const claims = new Map<number, number>();
  for (const { key } of counted) claims.set(key, (claims.get(key) ?? 0) + 1);
  return new Map(
    [...days].map(([key, total]) => [key, total > 0 ? (claims.get(key) ?? 0) / total : 0]),
  );
}

/** How many times as many claims as the rates give the network has in each calendar month. */
function seasonOf(
  covers: readonly CoveredCar[],
  counted: readonly CountedClaim[],
  rates: ReadonlyMap<number, number>,
): number[] {
  const [made, expected] = [Array<number>(12).fill(0), Array<number>(12).fill(0)];
  for (const { madeOn } of counted) made[monthOf(madeOn)]! += 1;
  if (covers.length > 0) {
    const first = covers.reduce((least, { begun }) => Math.min(least, begun), Infinity);
    const last = covers.reduce((most, { begun, daysRun }) => Math.max(most, begun + daysRun), 0);
    const steps = new Float64Array(last - first + 1);
    for (const cover of covers) {
      eachStretch(cover, (from, to, key) => {
        steps[from - first]! += rates.get(key) ?? 0;
        steps[to - first]! -= rates.get(key) ?? 0;
      });
    }
    const start = addDays('1970-01-01', first);
    let rate = 0;
    steps.forEach((step, day) => {
      rate += step;
      expected[monthOf(addDays(start, day))]! += rate;
    });
  }
  return made.map((claims, month) => (claims + SEASON_WEIGHT) / (expected[month]! + SEASON_WEIGHT));
}

function monthOf(date: string): number {
  return Number(date.slice(5, 7)) - 1;
}

function clamp(day: number, most: number): number {
  return Math.min(Math.max(day, 0), most);
}
