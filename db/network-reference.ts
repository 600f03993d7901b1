import type { Knex } from 'knex';
import type { CoverCell } from '#shared/domain/cover-cells';
import type { FunnelCell } from '#shared/domain/funnel';
import { compensatedSum } from '#shared/stats/compensated-sum';
import { sql, type Connection, type Query } from './database';
import {
  readFunnelCells,
  readProductParts,
  type FunnelAsked,
  type FunnelSource,
} from './queries/branches';
import { whereJobs, type JobFilters } from './queries/job-filters';
import {
  readQuoteFigures,
  type QuotedCar,
  type QuoteFigures,
  type QuoteRung,
} from './queries/quote';
import { readUsualFigures, type UsualFigures } from './queries/usual';
import { EVERY_PRODUCT, nearestNetworkSet } from './quote-reference';
import type { Scope } from './scope';
import { VISIBLE } from './visible-rows';
import { branchCells } from './warranty-reference';

/** Branches besides the caller's own that must stand behind a network figure before the caller may see it (rule 21). */
export const FEWEST_OTHERS = 5;

/** The visible facts of every branch, under the name that filters know; branch by branch, so that a period is found within each. */
const EVERY_FACT = `(select * from job_facts where branch_id in (select id from branches) and ${VISIBLE}) as job_facts`;

/** Cars of an age band over the network, summed. */
export interface ReferenceBand {
  /** Place in `AGE_BANDS`. */
  band: number;
  cars: number;
  withRot: number;
  /** Whether its share may be shown: of the network only with enough other branches that have cars in this band. */
  enoughBehind: boolean;
}

/** Cover and counted claims of a package, age band and year in service over the network, summed. */
export interface ReferenceCell extends CoverCell {
  /** Whether its sums may be shown: of the network only with enough other branches that have cover in this cell. */
  enoughBehind: boolean;
}

/**
 * The only reader of rows beyond a scope. It hands out sums, never rows, and only with at least five branches outside the
 * caller's reach behind them; head office, whose reach is the network, is always answered.
 */
export class NetworkReference {
  constructor(
    private readonly connection: Connection,
    private readonly scope: Scope,
  ) {}

  /**
   * Cars and cars with rot by age band over the network; where too few others stand behind them, over the branches that the
   * caller may see. Branch and region filters narrow neither: they choose rows, not what rows are compared with.
   */
  rotBands(filters: JobFilters): { kind: 'network' | 'scope'; bands: ReferenceBand[] } {
    const cells = this.all<{ branchId: number; band: number; cars: number; withRot: number }>(
      whereJobs(everyJob(), filters)
        .groupBy('branch_id', 'age_band')
        .select({ branchId: 'branch_id', band: 'age_band' })
        .count({ cars: '*' })
        .sum({ withRot: 'has_rot' }),
    );
    const ofNetwork = this.enoughBehind(cells);
    const counted = ofNetwork
      ? cells
      : cells.filter(({ branchId }) => !this.scope.isOutside(branchId));
    const bands = new Map<number, typeof cells>();
    for (const cell of counted) bands.set(cell.band, [...(bands.get(cell.band) ?? []), cell]);
    return {
      kind: ofNetwork ? 'network' : 'scope',
      bands: [...bands].map(([band, own]) => ({
        band,
        cars: total(own.map((cell) => cell.cars)),
        withRot: total(own.map((cell) => cell.withRot)),
        enoughBehind: !ofNetwork || this.enoughBehind(own),
      })),
    };
  }

  /**
   * Cover and counted claims as of a day by package, age band and year in service over the network (rule 20); where too few
   * others have cars with a warranty, over the branches that the caller may see. Branch and region filters narrow neither.
   */
  warrantyCells(
    filters: JobFilters,
    asOf: string,
  ): { kind: 'network' | 'scope'; cells: ReferenceCell[] } {
    const cells = branchCells(this.connection, () => whereJobs(everyJob(), filters), asOf);
    const ofNetwork = this.enoughBehind(cells);
    const byCell = new Map<string, typeof cells>();
    for (const cell of cells) {
      if (!ofNetwork && this.scope.isOutside(cell.branchId)) continue;
      const key = `${cell.packageId}/${cell.band}/${cell.year}`;
      byCell.set(key, [...(byCell.get(key) ?? []), cell]);
    }
    return {
      kind: ofNetwork ? 'network' : 'scope',
      cells: [...byCell.values()].map((own) => ({
        ...placeOf(own[0] as CoverCell),
        days: total(own.map((cell) => cell.days)),
        claims: total(own.map((cell) => cell.claims)),
        enoughBehind: !ofNetwork || this.enoughBehind(own.filter((cell) => cell.days > 0)),
      })),
    };
  }

  /**
   * Sums of a measure by age band and package over the network; where too few others have cars that it counts, over the branches
   * that the caller may see (rule 21). Branch and region filters narrow neither.
   */
  funnelCells(asked: FunnelAsked): {
    kind: 'network' | 'scope';
    cells: FunnelCell[];
    /** Product by product, where they are asked for apart. */
    products: { key: number; productId: number; ml: number }[];
  } {
    const source = this.everyRow();
    const all = readFunnelCells(source, asked);
    const ofNetwork = this.enoughBehind(all);
    const isCounted = ({ branchId }: { branchId: number }): boolean =>
      ofNetwork || !this.scope.isOutside(branchId);
    const products =
      asked.products === 'apart' ? readProductParts(source, asked.filters).filter(isCounted) : [];
    return {
      kind: ofNetwork ? 'network' : 'scope',
      cells: sumByKey(all.filter(isCounted)),
      products: products.map(({ key, productId, ml }) => ({ key, productId, ml })),
    };
  }

  /** The nearest set of the network's cars to the one quoted for the scope's branch, with five branches besides that one behind it: the same whoever asks (rule 48). */
  nearestQuoteSet(
    car: QuotedCar,
    rungs: readonly QuoteRung[],
    fewestCars: number,
  ): { rung: QuoteRung; figures: QuoteFigures } | undefined {
    const [branch] = this.scope.branches;
    const need = { cars: fewestCars, others: FEWEST_OTHERS };
    return (
      branch && nearestNetworkSet(this.connection, branch.id, car, rungs, need, readQuoteFigures)
    );
  }

  /** The same set with what its cars usually take; a figure of it is told only with as many cars and five other branches behind it alone. */
  nearestUsualSet(
    car: QuotedCar,
    rungs: readonly QuoteRung[],
    fewestCars: number,
    fewestBehind: number,
  ): { rung: QuoteRung; figures: UsualFigures } | undefined {
    const [branch] = this.scope.branches;
    const need = { cars: fewestCars, others: FEWEST_OTHERS };
    return (
      branch &&
      nearestNetworkSet(this.connection, branch.id, car, rungs, need, (source, ...set) =>
        readUsualFigures(
          source,
          branch.id,
          ...set,
          ({ cars, others }) => cars >= fewestBehind && others >= FEWEST_OTHERS,
        ),
      )
    );
  }

  /** Whether rows of at least five branches outside the caller's reach are among some; always for head office. */
  private enoughBehind(rows: readonly { branchId: number }[]): boolean {
    if (this.scope.ofNetwork) return true;
    const others = new Set(
      rows.map((row) => row.branchId).filter((id) => this.scope.isOutside(id)),
    );
    return others.size >= FEWEST_OTHERS;
  }

  private everyRow(): FunnelSource {
    return {
      facts: everyJob,
      products: () => sql.raw(EVERY_PRODUCT),
      claims: () => sql.raw('claims'),
      all: (query) => this.all(query),
    };
  }

  private all<Row>(query: Query): Row[] {
    return this.connection.all<Row>(query);
  }
}

function everyJob(): Knex.QueryBuilder {
  return sql.from(sql.raw(EVERY_FACT));
}

/** Which cell it is, without whose. */
function placeOf({ packageId, band, year }: CoverCell): Omit<CoverCell, 'days' | 'claims'> {
  return { packageId, band, year };
}

/** The cells of many branches as one a key. */
function sumByKey(cells: readonly FunnelCell[]): FunnelCell[] {
  const byKey = new Map<number, FunnelCell[]>();
  for (const cell of cells) byKey.set(cell.key, [...(byKey.get(cell.key) ?? []), cell]);
  return [...byKey].map(([key, own]) => {
    const sum = (of: (cell: FunnelCell) => number): number => compensatedSum(own.map(of));
    return {
      key,
      cars: sum(({ cars }) => cars),
      e: sum(({ e }) => e),
      parts: (own[0]?.parts ?? []).map((_, part) => sum(({ parts }) => parts[part] ?? 0)),
      aa: sum(({ aa }) => aa),
      ae: sum(({ ae }) => ae),
      ee: sum(({ ee }) => ee),
    };
  });
}

function total(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}
