import type { ReferenceCell } from '#db/network-reference';
import type { ExpectedRate } from '#shared/contracts/warranty';
import type { CoverCell, CoverCells } from '#shared/domain/cover-cells';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import { poissonInterval } from '#shared/stats/poisson-interval';
import { carYearsOf } from './claim-rate';

/** Claims seen beside claims expected. */
export interface AgainstExpected {
  claims: number;
  expected: number;
  ratio: number | null;
  lower: number | null;
  upper: number | null;
}

/** What a reference says of every package, age band and year in service. */
export class ExpectedClaims {
  private readonly cells: ReadonlyMap<string, ReferenceCell>;

  constructor(reference: readonly ReferenceCell[]) {
    this.cells = new Map(reference.map((cell) => [keyOf(cell), cell]));
  }

  /** Claims beside what the reference's rates give for the same cover (rule 20); no ratio where that is nothing (rule 47). */
  against(claims: number, cover: CoverCells): AgainstExpected {
    let expected = 0;
    for (const cell of cover.list()) expected += this.expectedIn(cell);
    if (expected === 0) return { claims, expected, ratio: null, lower: null, upper: null };
    const { lower, upper } = poissonInterval(claims);
    return {
      claims,
      expected,
      ratio: claims / expected,
      lower: lower / expected,
      upper: upper / expected,
    };
  }

  /** The rates behind some cover, by package, age band and year; sums of a cell with too few others behind it are withheld. */
  rates(cover: CoverCells, packageCodes: ReadonlyMap<number, string>): ExpectedRate[] {
    const rows = cover.list().flatMap((own): ExpectedRate[] => {
      const cell = this.cells.get(keyOf(own));
      if (own.days === 0 || !cell) return [];
      return [
        {
          package: packageCodes.get(own.packageId) ?? '',
          ageBand: AGE_BANDS[own.band] as ExpectedRate['ageBand'],
          yearInService: own.year,
          claims: cell.enoughBehind ? cell.claims : null,
          carYears: cell.enoughBehind ? carYearsOf(cell.days) : null,
          ownCarYears: carYearsOf(own.days),
        },
      ];
    });
    // Cells come by the package's id; those of one package are in order already.
    return rows.sort((one, other) => compare(one.package, other.package));
  }

  private expectedIn(own: CoverCell): number {
    const cell = this.cells.get(keyOf(own));
    return cell && cell.days > 0 ? (own.days * cell.claims) / cell.days : 0;
  }
}

function keyOf({ packageId, band, year }: Omit<CoverCell, 'days' | 'claims'>): string {
  return `${packageId}/${band}/${year}`;
}

function compare(one: string, other: string): number {
  return one < other ? -1 : one > other ? 1 : 0;
}
