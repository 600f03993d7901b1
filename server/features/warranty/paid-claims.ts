import { halfYearOf, halfYearsBetween, halfYearsFrom } from '#shared/domain/half-year';
import type { CarsAsked } from './cars-asked';

/** Claim cost paid by completion half-year and development half-year, in all up to each (rule 18). */
export interface PaidTriangle {
  cohorts: readonly string[];
  /** A row a cohort, oldest first, with n − i values. */
  rows: readonly (readonly number[])[];
}

/** What was paid up to a half-year's end, whatever the decision on the claim or the end of the warranty. */
export function paidTriangleOf(asked: CarsAsked, evaluatedOn: string): PaidTriangle {
  const { cohorts, claims } = asked;
  const last = halfYearOf(evaluatedOn);
  const [some] = cohorts;
  const oldest = cohorts.reduce((first, cohort) => (cohort < first ? cohort : first), some ?? '');
  const every = some === undefined ? [] : halfYearsFrom(oldest, last);
  const paid = new Map(every.map((cohort, row) => [cohort, zeros(every.length - row)]));
  for (const { car, paidOn, costCents } of claims) {
    if (paidOn === null || paidOn > evaluatedOn) continue;
    const cohort = cohorts[car] as string;
    const row = paid.get(cohort);
    if (row) row[halfYearsBetween(cohort, halfYearOf(paidOn))]! += costCents;
  }
  return { cohorts: every, rows: [...paid.values()].map(upTo) };
}

function zeros(count: number): number[] {
  return Array.from({ length: count }, () => 0);
}

function upTo(values: readonly number[]): number[] {
  let sum = 0;
  return values.map((value) => (sum += value));
}
