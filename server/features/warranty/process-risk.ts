import { practiceOf, type Practice } from '#db/queries/warranty';
import type { ProcessRisk, WarrantyAnswer } from '#shared/contracts/warranty';
import { addMonths } from '#shared/domain/calendar';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { AGE_BANDS, CHECKS } from '#shared/domain/vocabulary';
import { pooledRiskRatio } from '#shared/stats/mantel-haenszel';
import type { CarsAsked } from './cars-asked';

/** How long a car is looked at, so that all have been looked at equally long (rule 45). */
const MONTHS = 24;

/** Cars of an age band that were worked alike, and those of them with a claim in time. */
export interface AlikeCars {
  band: number;
  practice: Practice;
  cars: number;
  cases: number;
}

type PooledRisk = WarrantyAnswer['thinProduct'];

/** The cars that have been under warranty for 24 months, counted by age band and how they were worked. */
export function watchedCars(asked: CarsAsked): AlikeCars[] {
  const { cars, firstClaims, asOf } = asked;
  const counts = new Map<number, { cars: number; cases: number }>();
  const whole = new Map<string, boolean>();
  cars.completedOn.forEach((on, car) => {
    if ((cars.warrantyMonths[car] as number) < MONTHS) return;
    let over = whole.get(on);
    if (over === undefined) whole.set(on, (over = addMonths(on, MONTHS) <= asOf));
    if (!over) return;
    const key = (cars.practices[car] as number) * AGE_BANDS.length + (cars.bands[car] as number);
    let count = counts.get(key);
    if (!count) counts.set(key, (count = { cars: 0, cases: 0 }));
    count.cars += 1;
    if ((firstClaims.get(car) ?? Infinity) <= MONTHS) count.cases += 1;
  });
  return [...counts].map(([key, count]) => ({
    band: key % AGE_BANDS.length,
    practice: practiceOf(Math.floor(key / AGE_BANDS.length)),
    ...count,
  }));
}

/** How much likelier a claim was with each check missed than with it done; not applicable and not told are neither. */
export function processRisks(watched: readonly AlikeCars[]): ProcessRisk[] {
  return CHECKS.map((check, place) => ({
    check,
    ...pooled(watched, ({ checks }) => {
      const answer = checks[place];
      return answer === 'no' ? true : answer === 'yes' ? false : undefined;
    }),
  }));
}

/** The same with much less product than the norm against enough of it, among cars that have one. */
export function thinProductRisk(watched: readonly AlikeCars[]): PooledRisk {
  return pooled(watched, ({ thin }) => thin);
}

function pooled(
  watched: readonly AlikeCars[],
  isExposed: (practice: Practice) => boolean | undefined,
): PooledRisk {
  const tables = AGE_BANDS.map((ageBand) => ({
    ...{ ageBand, exposedCars: 0, exposedClaims: 0, unexposedCars: 0, unexposedClaims: 0 },
  }));
  for (const { band, practice, cars, cases } of watched) {
    const exposed = isExposed(practice);
    const table = tables[band];
    if (exposed === undefined || !table) continue;
    table[exposed ? 'exposedCars' : 'unexposedCars'] += cars;
    table[exposed ? 'exposedClaims' : 'unexposedClaims'] += cases;
  }
  const both = tables.filter(({ exposedCars, unexposedCars }) => exposedCars && unexposedCars);
  const all = both.reduce((sum, one) => sum + one.exposedCars + one.unexposedCars, 0);
  const risk =
    all < FEWEST_CARS
      ? undefined
      : pooledRiskRatio(
          both.map((one) => ({
            exposedCases: one.exposedClaims,
            exposedTotal: one.exposedCars,
            unexposedCases: one.unexposedClaims,
            unexposedTotal: one.unexposedCars,
          })),
        );
  return {
    riskRatio: risk?.riskRatio ?? null,
    lower: risk?.lower ?? null,
    upper: risk?.upper ?? null,
    strata: both.length,
    tables: tables.filter(({ exposedCars, unexposedCars }) => exposedCars + unexposedCars > 0),
  };
}
