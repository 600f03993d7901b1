import type { CoveredClaim, CoverLists } from '#db/queries/warranty';
import { dayNumber } from '#shared/domain/calendar';
import { monthInService, yearInService, type CoverBook } from '#shared/domain/warranty-cover';

/** Cover and claims of a package, age band and year in service over the network and all its history (rule 20). */
export interface RateCell {
  days: number;
  claims: number;
  /** Claims a day of cover. */
  rate: number;
}

/** Days of a car under cover in one year of its service: the first, and the day after the last, as numbers. */
export interface Stretch {
  from: number;
  to: number;
  cell: RateCell;
}

/** What all cars share that were finished on a day with the same warranty, package and age band; its stretches are never none. */
export interface CoverKind {
  stretches: readonly Stretch[];
}

/** The cars of a branch under warranty, each by its kind, in the order of their days. */
export interface BranchCover {
  branchId: number;
  cars: readonly CoverKind[];
}

/** More than there are age bands, than any warranty has years, and than it has months. */
const [BANDS, YEARS, MONTHS] = [8, 100, 1024];

/** The cars of every branch that has some under warranty, with the network's rates; branches in the order of their numbers. */
export function ratedCover(
  cars: readonly (CoverLists & { branchId: number })[],
  counted: readonly CoveredClaim[],
  book: CoverBook,
): BranchCover[] {
  const cells = new RateCells();
  const kinds = new CoverKinds(book, cells);
  const branches = cars.map(({ branchId, completedOn, warrantyMonths, packageIds, bands }) => {
    const own: CoverKind[] = [];
    completedOn.forEach((day, car) => {
      const sold = BANDS * packageIds[car]! + bands[car]!;
      const kind = kinds.of(day, warrantyMonths[car]!, sold);
      if (!kind) return;
      own.push(kind);
      for (const { from, to, cell } of kind.stretches) cell.days += to - from;
    });
    return { branchId, cars: own };
  });
  for (const { packageId, band, completedOn, madeOn } of counted) {
    const year = yearInService(monthInService(completedOn, madeOn));
    cells.of(BANDS * packageId + band, year).claims += 1;
  }
  cells.rate();
  return branches
    .filter((branch) => branch.cars.length > 0)
    .sort((one, other) => one.branchId - other.branchId);
}

class RateCells {
  private readonly known = new Map<number, RateCell>();

  of(sold: number, year: number): RateCell {
    const key = sold * YEARS + year - 1;
    let cell = this.known.get(key);
    if (!cell) this.known.set(key, (cell = { days: 0, claims: 0, rate: 0 }));
    return cell;
  }

  rate(): void {
    for (const cell of this.known.values()) cell.rate = cell.days > 0 ? cell.claims / cell.days : 0;
  }
}

class CoverKinds {
  private readonly days = new Map<string, Map<number, CoverKind | undefined>>();

  constructor(
    private readonly book: CoverBook,
    private readonly cells: RateCells,
  ) {}

  /** Undefined without a warranty. */
  of(completedOn: string, months: number, sold: number): CoverKind | undefined {
    const kinds = this.days.get(completedOn) ?? new Map<number, CoverKind | undefined>();
    const key = sold * MONTHS + months;
    if (!kinds.has(key)) {
      this.days.set(completedOn, kinds);
      kinds.set(key, this.made(completedOn, months, sold));
    }
    return kinds.get(key);
  }

  private made(completedOn: string, months: number, sold: number): CoverKind | undefined {
    const cover = this.book.coverOf(completedOn, months);
    if (!cover) return undefined;
    let from = dayNumber(completedOn) + 1;
    const stretches = cover.daysByYear.map((length, place) => {
      const stretch = { from, to: from + length, cell: this.cells.of(sold, place + 1) };
      from += length;
      return stretch;
    });
    return { stretches };
  }
}
