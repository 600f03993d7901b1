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

/** More than there are age bands. */
const BANDS = 8;

/** Adds up cars and their claims cell by cell. A car on its first day is in its first year's cell, with no day run. */
export class CoverCells {
  /** The years of each package and age band, the first year first. */
  private readonly kinds = new Map<number, CoverCell[]>();

  addCar(packageId: number, band: number, { daysByYear }: Pick<Cover, 'daysByYear'>): void {
    const years = this.yearsOf(packageId, band, daysByYear.length);
    for (let year = 0; year < daysByYear.length; year += 1) {
      (years[year] as CoverCell).days += daysByYear[year] as number;
    }
  }

  addClaim(packageId: number, band: number, year: number): void {
    (this.yearsOf(packageId, band, year)[year - 1] as CoverCell).claims += 1;
  }

  /** Takes over what others have added up. */
  addAll(others: CoverCells): void {
    for (const { packageId, band, year, days, claims } of others.list()) {
      const cell = this.yearsOf(packageId, band, year)[year - 1] as CoverCell;
      cell.days += days;
      cell.claims += claims;
    }
  }

  /** Every cell that a car has come to, always in the same order. */
  list(): CoverCell[] {
    return [...this.kinds]
      .sort(([one], [other]) => one - other)
      .flatMap(([, years]) => years.map((cell) => ({ ...cell })));
  }

  private yearsOf(packageId: number, band: number, most: number): CoverCell[] {
    const key = packageId * BANDS + band;
    let years = this.kinds.get(key);
    if (!years) this.kinds.set(key, (years = []));
    while (years.length < most) {
      years.push({ packageId, band, year: years.length + 1, days: 0, claims: 0 });
    }
    return years;
  }
}
