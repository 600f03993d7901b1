import type { SentJob } from '#shared/domain/normalise-job';
import { poissonInterval } from '#shared/stats/poisson-interval';
import { SOLD_MONTHS, type SentClaim, type SoldPackage } from './warranty-store';

/** A car as it was sent, where, and the claims made on it as they stand. */
export interface SoldCar {
  branch: string;
  region: string;
  job: SentJob;
  claims: SentClaim[];
}

/** Written out once more, apart from the product's own table. */
export const BANDS = ['0-4', '5-9', '10-14', '15-19', '20+'] as const;
const DAY = 86_400_000;

/** The months of warranty that a car was sold with. */
export function monthsOf({ job }: SoldCar): number {
  return SOLD_MONTHS[job.package as SoldPackage];
}

/** Days of cover of some cars that are over on a day. */
export function daysRun(cars: readonly SoldCar[], asOf: string): number {
  return cars.reduce((sum, car) => sum + coverDays(car, asOf).length, 0);
}

/** The last day under cover. */
export function endOf(car: SoldCar): string {
  return plus(car.job.completedOn, monthsOf(car));
}

/** The claims of some cars that count on a day. */
export function countedOf(cars: readonly SoldCar[], asOf: string): SentClaim[] {
  return cars.flatMap((car) =>
    car.claims.filter(
      (claim) =>
        isCovered(car) &&
        claim.madeOn <= asOf &&
        claim.madeOn <= endOf(car) &&
        !isRefused(claim, asOf),
    ),
  );
}

/** Claims of some cars against what a standard's rates give for their cover. */
export function againstExpected(
  cars: readonly SoldCar[],
  standard: readonly SoldCar[],
  asOf: string,
) {
  const claims = countedOf(cars, asOf).length;
  const expected = ratesOf(cars, standard, asOf).reduce(
    (sum, { claims: seen, carYears, ownCarYears }) => sum + (ownCarYears * seen) / carYears,
    0,
  );
  if (expected === 0) return { claims, expected, ratio: null, lower: null, upper: null };
  const { lower, upper } = poissonInterval(claims);
  const [low, high] = [lower / expected, upper / expected];
  return { claims, expected, ratio: claims / expected, lower: low, upper: high };
}

/** The calendar half-year of a day. */
export function halfYear(day: string): string {
  return `${day.slice(0, 4)}-H${day.slice(5, 7) < '07' ? 1 : 2}`;
}

/** The last end of a half-year not after a day, looked for day by day. */
export function lastEnd(asOf: string): string {
  let at = Date.parse(asOf);
  for (;;) {
    const day = new Date(at).toISOString().slice(0, 10);
    if (day.endsWith('-06-30') || day.endsWith('-12-31')) return day;
    at -= DAY;
  }
}

/** Paid up to each half-year's end by completion half-year. */
export function triangleOf(cars: readonly SoldCar[], evaluatedOn: string) {
  const last = halfYear(evaluatedOn);
  const cohorts: string[] = [];
  const oldest = cars.map(({ job }) => halfYear(job.completedOn)).sort()[0];
  for (let at = oldest; at !== undefined && at <= last; at = nextHalf(at)) cohorts.push(at);
  const rows = cohorts.map((cohort, row) => {
    const ends = cohorts.slice(row);
    const paid = cars
      .filter(({ job }) => halfYear(job.completedOn) === cohort)
      .flatMap(({ claims }) => claims)
      .filter(({ paidOn }) => paidOn !== undefined && paidOn <= evaluatedOn);
    return ends.map((end) =>
      paid
        .filter(({ paidOn }) => halfYear(paidOn!) <= end)
        .reduce((sum, { costCents = 0 }) => sum + costCents, 0),
    );
  });
  return { cohorts, rows };
}

function nextHalf(half: string): string {
  const year = Number(half.slice(0, 4));
  return half.endsWith('1') ? `${year}-H2` : `${year + 1}-H1`;
}

/** Whether a car was sold with a warranty. */
export function isCovered(car: SoldCar): boolean {
  return monthsOf(car) > 0;
}

/** Whether a claim was refused by a day. */
export function isRefused({ decision, decidedOn }: SentClaim, asOf: string): boolean {
  return decision === 'refused' && (decidedOn === undefined || decidedOn <= asOf);
}

/** So many months later, the last of the month where there is no such day. */
export function plus(day: string, months: number): string {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number];
  const last = new Date(Date.UTC(year, month + months, 0)).getUTCDate();
  const at = Date.UTC(year, month - 1 + months, Math.min(date, last));
  return new Date(at).toISOString().slice(0, 10);
}

/** Every day under cover that is over, as the year in service it lies in. */
function coverDays(car: SoldCar, asOf: string): number[] {
  if (!isCovered(car)) return [];
  const { completedOn } = car.job;
  const until = Date.parse(endOf(car) < asOf ? endOf(car) : asOf);
  const years: number[] = [];
  let [year, limit] = [1, Date.parse(plus(completedOn, 12))];
  for (let at = Date.parse(completedOn) + DAY; at <= until; at += DAY) {
    if (at > limit) limit = Date.parse(plus(completedOn, 12 * (year += 1)));
    years.push(year);
  }
  return years;
}

/** The month since completion that a day lies in. */
export function monthOf(car: SoldCar, day: string): number {
  let month = 1;
  while (day > plus(car.job.completedOn, month)) month += 1;
  return month;
}

/** The month of a car's first counted claim. */
export function firstClaim(car: SoldCar, asOf: string): number | undefined {
  const months = countedOf([car], asOf).map(({ madeOn }) => monthOf(car, madeOn));
  return months.sort((a, b) => a - b)[0];
}

/** The age band of a car when it was completed. */
export function bandOf({ job }: SoldCar): (typeof BANDS)[number] {
  const count = (text: string) => Number(text.slice(0, 4)) * 12 + Number(text.slice(5, 7));
  const months = count(job.completedOn) - count(job.vehicle.firstRegistered);
  return BANDS[Math.min(4, Math.floor(Math.floor(months / 12) / 5))]!;
}

/** Every package, age band and year in service that the cars were under cover in. */
export function ratesOf(cars: readonly SoldCar[], standard: readonly SoldCar[], asOf: string) {
  const packages = [...new Set(cars.map(({ job }) => job.package))].sort();
  return packages.flatMap((sold) =>
    BANDS.flatMap((ageBand) => {
      const isMeant = (car: SoldCar) => car.job.package === sold && bandOf(car) === ageBand;
      const [mine, theirs] = [cars.filter(isMeant), standard.filter(isMeant)];
      const days = (group: readonly SoldCar[], year: number) =>
        group.flatMap((car) => coverDays(car, asOf)).filter((one) => one === year).length;
      return [1, 2, 3, 4, 5].flatMap((year) => {
        const own = days(mine, year);
        if (own === 0) return [];
        const claims = theirs.flatMap((car) =>
          countedOf([car], asOf).filter(
            ({ madeOn }) => Math.ceil(monthOf(car, madeOn) / 12) === year,
          ),
        ).length;
        const carYears = days(theirs, year) / 365.25;
        return [
          {
            ...{ package: sold, ageBand, yearInService: year, claims, carYears },
            ownCarYears: own / 365.25,
            behind: theirs.filter((car) => coverDays(car, asOf).includes(year)),
          },
        ];
      });
    }),
  );
}
