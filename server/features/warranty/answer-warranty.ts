import type { NetworkReference } from '#db/network-reference';
import { packageCodes } from '#db/queries/overrun';
import type { ScopedDb } from '#db/scoped-db';
import type { WarrantyAnswer, WarrantyBranch, WarrantyCohort } from '#shared/contracts/warranty';
import { lastHalfYearEnd } from '#shared/domain/half-year';
import type { Period } from '#shared/domain/period';
import { branchCohorts, together, type BranchCohort } from './branch-cohorts';
import { readCarsAsked, type CarsAsked } from './cars-asked';
import { allTimes, claimFreeMonths } from './claim-free';
import { claimsByCause, claimsByZone } from './claim-places';
import { carYearsOf, claimRateOf } from './claim-rate';
import { compareGroups, curveOf, everyGroup, shownGroups } from './curve-groups';
import { ExpectedClaims } from './expected-claims';
import { leftOut } from './left-out';
import { paidTriangleOf } from './paid-claims';
import { processRisks, thinProductRisk, watchedCars } from './process-risk';
import { projectPayments, toldTriangle, type ProjectedPayments } from './project-payments';
import type { WarrantyQuestion } from './warranty-question';

/** Everything about warranty as of a day, with the sums that each figure is made of; one snapshot of the database. */
export function answerWarranty(
  db: ScopedDb,
  question: WarrantyQuestion,
  network: NetworkReference,
): WarrantyAnswer {
  return db.snapshot(() => {
    const { asOf, filters, from, to, groupBy } = question;
    const evaluatedOn = lastHalfYearEnd(asOf);
    const asked = readCarsAsked(db, question);
    const reference = network.warrantyCells({ ...filters, from, to: earlier(to, asOf) }, asOf);
    const expected = new ExpectedClaims(reference.cells);
    const codes = packageCodes(db);
    const cohorts = branchCohorts(asked);
    const all = together(cohorts);
    const groups = everyGroup(asked, groupBy, db.scope, codes);
    const shown = shownGroups(groups, question.groups);
    const triangle = paidTriangleOf(asked, evaluatedOn);
    const payments = projectPayments(triangle);
    const watched = watchedCars(asked);
    return {
      period: periodOf(asked, question),
      scope: db.scope.echo(),
      jobs: all.cars,
      reference: reference.kind,
      asOf,
      evaluatedOn,
      covered: all.covered,
      rate: claimRateOf(all.claims, all.daysRun),
      claimFree: claimFreeMonths(allTimes(groups)),
      groupBy,
      groups: shown.map(curveOf),
      everyGroup: groups.map(({ key, cars }) => ({ key, cars })),
      logRank: compareGroups(shown),
      cohorts: cohortRows(cohorts, payments, expected),
      total: payments.total,
      triangle: toldTriangle(triangle, payments.ladder),
      branches: branchRows(db, cohorts, expected),
      expectedRates: expected.rates(all.cells, codes),
      process: processRisks(watched),
      thinProduct: thinProductRisk(watched),
      causes: claimsByCause(asked),
      zones: claimsByZone(asked),
      left: leftOut(asked, evaluatedOn),
    };
  });
}

/** The first job … asOf unless other days were asked for (rule 15). */
function periodOf({ cars, asOf }: CarsAsked, { from, to = asOf }: WarrantyQuestion): Period {
  const first = cars.completedOn.reduce(
    (least, on) => (on < least ? on : least),
    earlier(to, asOf),
  );
  return { from: from ?? first, to };
}

function earlier(to: string | undefined, asOf: string): string {
  return to !== undefined && to < asOf ? to : asOf;
}

/** Every half-year up to the evaluation day, without gaps. */
function cohortRows(
  groups: readonly BranchCohort[],
  { byCohort }: ProjectedPayments,
  expected: ExpectedClaims,
): WarrantyCohort[] {
  return [...byCohort].map(([cohort, cents]) => {
    const all = together(groups.filter((group) => group.cohort === cohort));
    return { cohort, cars: all.cars, ...cents, ...expected.against(all.claims, all.cells) };
  });
}

/** The branches of the scope that sold a warranty. */
function branchRows(
  { scope }: ScopedDb,
  groups: readonly BranchCohort[],
  expected: ExpectedClaims,
): WarrantyBranch[] {
  return scope.branches.flatMap(({ id, code }): WarrantyBranch[] => {
    const all = together(groups.filter(({ branchId }) => branchId === id));
    if (all.covered === 0) return [];
    const cover = { cars: all.covered, carYears: carYearsOf(all.daysRun) };
    return [{ branch: code, ...cover, ...expected.against(all.claims, all.cells) }];
  });
}
