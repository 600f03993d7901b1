import { isOpenOn } from '#shared/domain/claim-standing';
import { CoverCells } from '#shared/domain/cover-cells';
import { yearInService } from '#shared/domain/warranty-cover';
import type { CarsAsked } from './cars-asked';

/** The cars of one branch finished in one half-year. */
export interface BranchCohort {
  branchId: number;
  cohort: string;
  cars: number;
  covered: number;
  daysRun: number;
  daysLeft: number;
  /** Counted claims, and those of them that were not decided on the as-of day. */
  claims: number;
  claimsOpen: number;
  /** Cover and counted claims by package, age band and year in service. */
  cells: CoverCells;
}

/** Counts every car and claim into its branch and completion half-year, by branch id and half-year. */
export function branchCohorts(asked: CarsAsked): BranchCohort[] {
  const { cars, covers, cohorts, claims, asOf } = asked;
  const groups = new Map<string, BranchCohort>();
  let before = emptyGroup(0, '');
  const groupOf = (car: number): BranchCohort => {
    const [branchId, cohort] = [cars.branchIds[car] as number, cohorts[car] as string];
    // Cars come branch by branch and day by day: most often it is the group of the one before.
    if (before.branchId === branchId && before.cohort === cohort) return before;
    const key = `${branchId}/${cohort}`;
    let group = groups.get(key);
    if (!group) groups.set(key, (group = emptyGroup(branchId, cohort)));
    return (before = group);
  };
  covers.forEach((cover, car) => {
    const group = groupOf(car);
    group.cars += 1;
    if (!cover) return;
    group.covered += 1;
    group.daysRun += cover.daysRun;
    group.daysLeft += cover.daysLeft;
    group.cells.addCar(cars.packageIds[car] as number, cars.bands[car] as number, cover);
  });
  for (const claim of claims) {
    if (claim.standing !== 'counted') continue;
    const group = groupOf(claim.car);
    group.claims += 1;
    if (isOpenOn(claim, asOf)) group.claimsOpen += 1;
    const place = [cars.packageIds[claim.car] as number, cars.bands[claim.car] as number] as const;
    group.cells.addClaim(...place, yearInService(claim.month));
  }
  return [...groups.values()].sort(
    (one, other) => one.branchId - other.branchId || (one.cohort < other.cohort ? -1 : 1),
  );
}

/** Some groups as one. */
export function together(
  groups: readonly BranchCohort[],
): Omit<BranchCohort, 'branchId' | 'cohort'> {
  const all = emptyGroup(0, '');
  for (const group of groups) {
    for (const count of COUNTS) all[count] += group[count];
    all.cells.addAll(group.cells);
  }
  return all;
}

const COUNTS = ['cars', 'covered', 'daysRun', 'daysLeft', 'claims', 'claimsOpen'] as const;

function emptyGroup(branchId: number, cohort: string): BranchCohort {
  const counts = { cars: 0, covered: 0, daysRun: 0, daysLeft: 0, claims: 0, claimsOpen: 0 };
  return { branchId, cohort, ...counts, cells: new CoverCells() };
}
