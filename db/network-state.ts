import { CostBook } from '#shared/domain/cost-book';
import { sql, type Connection } from './database';
import { listCostEntries } from './queries/cost-entries';
import type { ScopedBranch } from './scope';

export interface PackageEntry {
  id: number;
  code: string;
  warrantyMonths: number;
}

/**
 * What every request needs of the network, kept in memory by the one process that writes: branches, the catalogue, the cost
 * book of the visible generation and, while a restatement runs, the next book. Read again after every change of set-up.
 */
export class NetworkState {
  branches: readonly ScopedBranch[] = [];
  costs: CostBook = CostBook.empty;
  /** The book of the generation being built; jobs that arrive meanwhile get a row in both. */
  nextCosts: CostBook | undefined;
  generation = 0;
  private products = new Map<string, number>();
  private packages = new Map<string, PackageEntry>();

  constructor(private readonly connection: Connection) {
    this.reload();
  }

  /** Reads everything again from what is committed (or, inside a write, about to be). */
  reload(): void {
    this.generation = this.one<{ generation: number }>('select generation from network').generation;
    this.branches = this.connection.all<ScopedBranch>(
      sql('branches')
        .join('regions', 'regions.id', 'branches.region_id')
        .orderBy('branches.code')
        .select('branches.id', 'branches.code', 'branches.name', {
          region: 'regions.code',
          timeZone: 'branches.time_zone',
        }),
    );
    this.products = new Map(
      this.connection
        .all<{ id: number; code: string }>(sql('products').select('id', 'code'))
        .map((row) => [row.code, row.id]),
    );
    this.packages = new Map(
      this.connection
        .all<PackageEntry>(
          sql('packages').select('id', 'code', { warrantyMonths: 'warranty_months' }),
        )
        .map((row) => [row.code, row]),
    );
    this.costs = CostBook.of(listCostEntries(this.connection, sql('branch_rates')));
  }

  productId(code: string): number | undefined {
    return this.products.get(code);
  }

  package(code: string): PackageEntry | undefined {
    return this.packages.get(code);
  }

  private one<Row>(text: string): Row {
    return this.connection.prepare(text).get() as Row;
  }
}
