import { halfYearOf } from '#shared/domain/half-year';
import {
  CoverBook,
  DAYS_A_YEAR,
  monthInService,
  yearInService,
} from '#shared/domain/warranty-cover';
import { addMonths } from '#shared/domain/calendar';
import { AGE_BANDS, type Check } from '#shared/domain/vocabulary';
import { pooledRiskRatio, type PooledRiskRatio } from '#shared/stats/mantel-haenszel';
import { poissonInterval } from '#shared/stats/poisson-interval';
import { PACKAGES } from './catalogue';
import type { Car } from './measured-cars';

const WARRANTY = new Map<string, number>(
  PACKAGES.map((entry) => [entry.code, entry.warrantyMonths]),
);
/** How long a car is followed for the process checks (rule 45). */
const FOLLOWED_MONTHS = 24;

/** Claims of some cars against what the network's rates lead to for them, with the exact interval of the ratio. */
export interface AgainstExpected {
  claims: number;
  expected: number;
  lower: number;
  upper: number;
}

/** Observed against expected of every group of cars, the network's rates by package, age band and year in service (rule 20). */
export function againstExpected(
  cars: readonly Car[],
  today: string,
  groupOf: (car: Car) => string,
): Map<string, AgainstExpected> {
  const rates = new Map<string, { claims: number; years: number }>();
  const years = new Map<Car, number[]>();
  const cellOf = (car: Car, year: number) =>
    `${car.content.package} ${car.figures.ageBand} ${year}`;
  const book = new CoverBook(today);
  const cell = (car: Car, year: number) => {
    const known = rates.get(cellOf(car, year)) ?? { claims: 0, years: 0 };
    rates.set(cellOf(car, year), known);
    return known;
  };
  for (const car of cars) {
    const cover = book.coverOf(car.content.completedOn, monthsOf(car));
    const own = (cover?.daysByYear ?? []).map((days) => days / DAYS_A_YEAR);
    years.set(car, own);
    own.forEach((run, index) => (cell(car, index + 1).years += run));
    for (const { content } of car.claims) {
      const month = monthInService(car.content.completedOn, content.madeOn);
      cell(car, yearInService(month)).claims += 1;
    }
  }
  const groups = new Map<string, { claims: number; expected: number }>();
  for (const car of cars) {
    const group = groups.get(groupOf(car)) ?? { claims: 0, expected: 0 };
    groups.set(groupOf(car), group);
    group.claims += car.claims.length;
    years.get(car)?.forEach((run, index) => {
      const rate = cell(car, index + 1);
      if (rate.years > 0) group.expected += (run * rate.claims) / rate.years;
    });
  }
  return new Map([...groups].map(([key, group]) => [key, withInterval(group)]));
}

/** Observed against expected of every calendar half-year of completion. */
export function cohortsAgainstExpected(
  cars: readonly Car[],
  today: string,
): Map<string, AgainstExpected> {
  return againstExpected(cars, today, (car) => halfYearOf(car.content.completedOn));
}

/** How many times as likely a claim within 24 months is where a check was missed, pooled over age bands (rule 45). */
export function riskOfMissing(
  cars: readonly Car[],
  check: Check,
  today: string,
): PooledRiskRatio | undefined {
  const followed = cars.filter(
    (car) =>
      monthsOf(car) >= FOLLOWED_MONTHS &&
      addMonths(car.content.completedOn, FOLLOWED_MONTHS) <= today,
  );
  return pooledRiskRatio(
    AGE_BANDS.map((band) => {
      const inBand = followed.filter((car) => car.figures.ageBand === band);
      const missed = inBand.filter((car) => car.content.checks?.[check] === 'no');
      const done = inBand.filter((car) => car.content.checks?.[check] === 'yes');
      return {
        exposedCases: missed.filter(cameBack).length,
        exposedTotal: missed.length,
        unexposedCases: done.filter(cameBack).length,
        unexposedTotal: done.length,
      };
    }),
  );
}

function cameBack(car: Car): boolean {
  return car.claims.some(
    ({ content }) => monthInService(car.content.completedOn, content.madeOn) <= FOLLOWED_MONTHS,
  );
}

function monthsOf(car: Car): number {
  return WARRANTY.get(car.content.package) ?? 0;
}

function withInterval(group: { claims: number; expected: number }): AgainstExpected {
  const { lower, upper } = poissonInterval(group.claims);
  return { ...group, lower: lower / group.expected, upper: upper / group.expected };
}
