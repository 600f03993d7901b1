import { CostBook, type CostChange } from '#shared/domain/cost-book';
import type { BodyType, ConsumableKind } from '#shared/domain/vocabulary';
import { sql, type Connection } from './database';
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
    this.costs = CostBook.of(this.costEntries());
  }

  productId(code: string): number | undefined {
    return this.products.get(code);
  }

  package(code: string): PackageEntry | undefined {
    return this.packages.get(code);
  }

  private costEntries(): CostChange[] {
    const rates = this.connection.all<{ code: string; from_date: string; value: number }>(
      sql('branch_rates')
        .join('branches', 'branches.id', 'branch_rates.branch_id')
        .select('branches.code', 'from_date', { value: 'hourly_cost_cents' }),
    );
    const products = this.connection.all<{ code: string; from_date: string; value: number }>(
      sql('product_costs')
        .join('products', 'products.id', 'product_costs.product_id')
        .select('products.code', 'from_date', { value: 'cost_per_litre_cents' }),
    );
    const consumables = this.connection.all<{
      code: ConsumableKind;
      from_date: string;
      value: number;
    }>(sql('consumable_costs').select({ code: 'kind' }, 'from_date', { value: 'unit_cost_cents' }));
    const fees = this.connection.all<{ from_date: string; value: number }>(
      sql('network_fees').select('from_date', { value: 'fee_micros' }),
    );
    return [
      ...rates.map((row) => ({ kind: 'hourlyCost' as const, ...dated(row) })),
      ...products.map((row) => ({ kind: 'product' as const, ...dated(row) })),
      ...consumables.map((row) => ({
        kind: 'consumable' as const,
        code: row.code,
        from: row.from_date,
        value: row.value,
      })),
      ...fees.map((row) => ({ kind: 'fee' as const, from: row.from_date, value: row.value })),
      ...this.normEntries(),
    ];
  }

  private normEntries(): CostChange[] {
    const lines = this.connection.all<{
      package: string;
      body_type: BodyType;
      product: string;
      ml: number;
    }>(
      sql('norms')
        .join('packages', 'packages.id', 'norms.package_id')
        .join('products', 'products.id', 'norms.product_id')
        .orderBy(['packages.code', 'body_type', 'products.code'])
        .select({ package: 'packages.code' }, 'body_type', { product: 'products.code' }, 'ml'),
    );
    const norms = new Map<string, Extract<CostChange, { kind: 'norm' }>>();
    for (const line of lines) {
      const key = `${line.package} ${line.body_type}`;
      const norm = norms.get(key) ?? {
        kind: 'norm',
        package: line.package,
        bodyType: line.body_type,
        lines: [],
      };
      norm.lines.push({ product: line.product, ml: line.ml });
      norms.set(key, norm);
    }
    return [...norms.values()];
  }

  private one<Row>(text: string): Row {
    return this.connection.prepare(text).get() as Row;
  }
}

function dated(row: { code: string; from_date: string; value: number }): {
  code: string;
  from: string;
  value: number;
} {
  return { code: row.code, from: row.from_date, value: row.value };
}
