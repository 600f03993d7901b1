import type { Knex } from 'knex';
import { claimStanding } from '#shared/domain/claim-standing';
import { CoverCells, type CoverCell } from '#shared/domain/cover-cells';
import { CoverBook, monthInService, yearInService } from '#shared/domain/warranty-cover';
import type { Connection } from './database';
import { readCoveredClaims, readCoverByBranch } from './queries/warranty';

/** A cell of one branch. */
export interface BranchCell extends CoverCell {
  branchId: number;
}

/** Cover and claims as of a day, cell by cell and branch by branch; `facts` begins a query over every car to be counted. */
export function branchCells(
  connection: Connection,
  facts: () => Knex.QueryBuilder,
  asOf: string,
): BranchCell[] {
  const book = new CoverBook(asOf);
  const branches = new Map<number, CoverCells>();
  const cellsOf = (branchId: number): CoverCells => {
    let cells = branches.get(branchId);
    if (!cells) branches.set(branchId, (cells = new CoverCells()));
    return cells;
  };
  for (const cars of readCoverByBranch(connection, facts())) {
    for (let car = 0; car < cars.completedOn.length; car += 1) {
      const months = cars.warrantyMonths[car] as number;
      const cover = book.coverOf(cars.completedOn[car] as string, months);
      if (!cover) continue;
      const cells = cellsOf(cars.branchId);
      cells.addCar(cars.packageIds[car] as number, cars.bands[car] as number, cover);
    }
  }
  for (const claim of readCoveredClaims(connection, facts(), asOf)) {
    const { branchId, packageId, band, completedOn, warrantyMonths, madeOn } = claim;
    const end = book.coverOf(completedOn, warrantyMonths)?.end;
    if (claimStanding(claim, end, asOf) !== 'counted') continue;
    const year = yearInService(monthInService(completedOn, madeOn));
    cellsOf(branchId).addClaim(packageId, band, year);
  }
  return [...branches].flatMap(([branchId, cells]) =>
    cells.list().map((cell) => ({ ...cell, branchId })),
  );
}
