import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { WarrantyRiskRow } from '#shared/contracts/warranty-reports';
import { halfYearOf, halfYearsBetween, lastHalfYearEnd } from '#shared/domain/half-year';
import { originError } from '#shared/stats/chain-ladder';
import { branchCohorts, type BranchCohort } from './branch-cohorts';
import { readCarsAsked, type CarsAsked } from './cars-asked';
import { carYearsOf, claimRateOf } from './claim-rate';
import { ExpectedClaims } from './expected-claims';
import { paidTriangleOf } from './paid-claims';
import { centsOrNull, projectPayments, type ProjectedPayments } from './project-payments';
import { shareInCents } from './share-in-cents';
import type { RiskQuestion } from './warranty-question';

/**
 * The warranty-risk rows, by branch and completion half-year (rule 51). Asked with the scope of the whole network: a branch's
 * rows are its part of the network's triangle, so the rows of a half-year add up to the network's to the cent, and choosing
 * branches leaves out rows without changing others.
 */
export function warrantyRiskRows(
  db: ScopedDb,
  question: RiskQuestion,
  network: NetworkReference,
): WarrantyRiskRow[] {
  return db.snapshot(() => {
    const { asOf, filters, from, to = asOf, branches } = question;
    const evaluatedOn = lastHalfYearEnd(asOf);
    const asked = readCarsAsked(db, question);
    const cells = network.warrantyCells(
      { ...filters, from, to: to < asOf ? to : asOf },
      asOf,
    ).cells;
    const expected = new ExpectedClaims(cells);
    const payments = projectPayments(paidTriangleOf(asked, evaluatedOn));
    const groups = branchCohorts(asked);
    const paid = paidByGroup(asked, evaluatedOn);
    const outstanding = outstandingByGroup(db, groups, paid, payments);
    return db.scope.branches
      .filter(({ code }) => !branches || branches.includes(code))
      .flatMap(({ id, code }) =>
        groups
          .filter(({ branchId }) => branchId === id)
          .map((group): WarrantyRiskRow => {
            const { carYears, per1000, lower, upper } = claimRateOf(group.claims, group.daysRun);
            const against = expected.against(group.claims, group.cells);
            const paidCents = paid.get(keyOf(group)) ?? 0;
            return {
              branch: code,
              cohort: group.cohort,
              carsCovered: group.covered,
              carYearsRun: carYears,
              carYearsLeft: carYearsOf(group.daysLeft),
              claims: group.claims,
              paidCents,
              per1000,
              lower,
              upper,
              expected: against.expected,
              ratio: against.ratio,
              outstandingCents: outstanding.get(keyOf(group)) ?? null,
              standardErrorCents: errorCents(group.cohort, paidCents, evaluatedOn, payments),
              claimsOpen: group.claimsOpen,
            };
          }),
      );
  });
}

type GroupKey = Pick<BranchCohort, 'branchId' | 'cohort'>;

function keyOf({ branchId, cohort }: GroupKey): string {
  return `${branchId}/${cohort}`;
}

/** What was paid up to the evaluation day. */
function paidByGroup({ cars, cohorts, claims }: CarsAsked, evaluatedOn: string) {
  const paid = new Map<string, number>();
  for (const { car, paidOn, costCents } of claims) {
    if (paidOn === null || paidOn > evaluatedOn) continue;
    const branchId = cars.branchIds[car] as number;
    const key = keyOf({ branchId, cohort: cohorts[car] as string });
    paid.set(key, (paid.get(key) ?? 0) + costCents);
  }
  return paid;
}

/** Each half-year's cost still to come, shared out by what its branches have paid; of branches with equal claim to a cent, by code. */
function outstandingByGroup(
  { scope }: ScopedDb,
  groups: readonly BranchCohort[],
  paid: ReadonlyMap<string, number>,
  { byCohort }: ProjectedPayments,
): Map<string, number> {
  const shares = new Map<string, number>();
  for (const [cohort, { outstandingCents }] of byCohort) {
    const keys = scope.branches
      .filter(({ id }) => groups.some((one) => one.branchId === id && one.cohort === cohort))
      .map(({ id }) => keyOf({ branchId: id, cohort }));
    const cents = shareInCents(
      outstandingCents,
      keys.map((key) => paid.get(key) ?? 0),
    );
    keys.forEach((key, index) => shares.set(key, cents[index] as number));
  }
  return shares;
}

/** Mack's error of what a branch has paid, by the network's factors. */
function errorCents(
  cohort: string,
  paidCents: number,
  evaluatedOn: string,
  { ladder, byCohort }: ProjectedPayments,
): number | null {
  if (!ladder || !byCohort.has(cohort)) return null;
  const age = halfYearsBetween(cohort, halfYearOf(evaluatedOn));
  return centsOrNull(originError(paidCents, age, ladder));
}
