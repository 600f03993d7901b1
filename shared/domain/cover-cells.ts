import type { Cover } from './warranty-cover';

/** Cover run and claims counted of one package, age band and year in service (rule 20). */
export interface CoverCell {
  packageId: number;
  /** Place in `AGE_BANDS`. */
  band: number;
  year: number;
  days: number;
  claims: number;
}

/** More years in service than any warranty has. */
const YEARS = 64;
const BANDS = 8;

/** Adds up cars and their claims cell by cell. A car on its first day is in its first year's cell, with no day run. */
export class CoverCells {
  private readonly cells = new Map<number, CoverCell>();

  addCar(packageId: number, band: number, { daysByYear }: Pick<Cover, 'daysByYear'>): void {
    for (let year = 1; year <= daysByYear.length; year += 1) {
      this.cell(packageId, band, year).days += daysByYear[year - 1] as number;
    }
  }

  addClaim(packageId: number, band: number, year: number): void {
    this.cell(packageId, band, year).claims += 1;
  }

  /** Takes over what others have added up. */
  addAll(others: CoverCells): void {
    for (const { packageId, band, year, days, claims } of others.cells.values()) {
      const cell = this.cell(packageId, band, year);
      cell.days += days;
      cell.claims += claims;
    }
  }

  /** Every cell with a car, always in the same order. */
  list(): CoverCell[] {
    return [...this.cells].sort(([one], [other]) => one - other).map(([, cell]) => ({ ...cell }));
  }

  private cell(packageId: number, band: number, year: number): CoverCell {
    const key = (packageId * BANDS + band) * YEARS + year;
    let cell = this.cells.get(key);
    if (!cell) this.cells.set(key, (cell = { packageId, band, year, days: 0, claims: 0 }));
    return cell;
  }
}
