import {
  readClaims,
  readWarrantyCars,
  type ClaimRow,
  type WarrantyCars,
} from '#db/queries/warranty';
import type { ScopedDb } from '#db/scoped-db';
import { claimStanding, type ClaimStanding } from '#shared/domain/claim-standing';
import { halfYearOf } from '#shared/domain/half-year';
import { CoverBook, monthInService, type Cover } from '#shared/domain/warranty-cover';
import type { CoverQuestion } from './warranty-question';

/** A claim on one of the cars asked for, made by the as-of day. */
export interface CarClaim extends ClaimRow {
  /** The car's place in every list. */
  car: number;
  standing: ClaimStanding;
  /** Month since completion in which it was made. */
  month: number;
}

/** The cars of a question that were completed by its as-of day, and their claims. */
export interface CarsAsked {
  asOf: string;
  /** One place a car in every list. */
  cars: WarrantyCars;
  /** Completion half-years. */
  cohorts: readonly string[];
  /** Undefined for a car without a warranty. */
  covers: readonly (Cover | undefined)[];
  claims: readonly CarClaim[];
  /** The month of a car's first counted claim, by its place; absent without one. */
  firstClaims: ReadonlyMap<number, number>;
}

/** Reads cars and claims once for everything that is told of them. */
export function readCarsAsked(
  db: ScopedDb,
  { asOf, from, to = asOf, filters }: CoverQuestion,
): CarsAsked {
  const cars = readWarrantyCars(db, { ...filters, from, to: to < asOf ? to : asOf });
  const book = new CoverBook(asOf);
  const covers = cars.completedOn.map((on, car) =>
    book.coverOf(on, cars.warrantyMonths[car] as number),
  );
  const claims = placed(readClaims(db, asOf), cars).map((claim) => ({
    ...claim,
    standing: claimStanding(claim, covers[claim.car]?.end, asOf),
    month: monthInService(cars.completedOn[claim.car] as string, claim.madeOn),
  }));
  return {
    asOf,
    cars,
    cohorts: halfYearsOf(cars.completedOn),
    covers,
    claims,
    firstClaims: firstMonths(claims),
  };
}

/** Cars come day by day, so each half-year's text is made once for many of them. */
function halfYearsOf(days: readonly string[]): string[] {
  let [day, halfYear] = ['', ''];
  return days.map((on) => {
    if (on !== day) [day, halfYear] = [on, halfYearOf(on)];
    return halfYear;
  });
}

/** Claims with the place of their car; those on other cars, or on void jobs, are not asked for. */
function placed(
  rows: readonly ClaimRow[],
  { jobIds }: WarrantyCars,
): (ClaimRow & { car: number })[] {
  const wanted = new Map<number, number | undefined>(rows.map(({ jobId }) => [jobId, undefined]));
  jobIds.forEach((jobId, car) => {
    if (wanted.has(jobId)) wanted.set(jobId, car);
  });
  return rows.flatMap((row) => {
    const car = wanted.get(row.jobId);
    return car === undefined ? [] : { ...row, car };
  });
}

function firstMonths(claims: readonly CarClaim[]): Map<number, number> {
  const months = new Map<number, number>();
  for (const { car, standing, month } of claims) {
    if (standing === 'counted') months.set(car, Math.min(month, months.get(car) ?? month));
  }
  return months;
}
