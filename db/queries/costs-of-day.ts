import type { Knex } from 'knex';
import type { ConsumableKind } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';

/** The costs that hold on one day; what has none is absent. */
export interface CostsOfDay {
  /** Millionths of revenue. */
  feeMicros: number | undefined;
  /** Cents an hour by branch code. */
  hourlyCents: ReadonlyMap<string, number>;
  /** Cents a litre by product code. */
  litreCents: ReadonlyMap<string, number>;
  /** Cents a piece. */
  pieceCents: ReadonlyMap<ConsumableKind, number>;
}

/** The fee and the costs of products, consumables and the branches in scope that are valid on a day. */
export function readCostsOfDay(db: ScopedDb, on: string): CostsOfDay {
  const fee = db.first<{ value: number }>(
    sql('network_fees')
      .where('from_date', '<=', on)
      .orderBy('from_date', 'desc')
      .limit(1)
      .select({ value: 'fee_micros' }),
  );
  return {
    feeMicros: fee?.value,
    hourlyCents: valid(
      db,
      db.table('branch_rates').join('branches', 'branches.id', 'branch_rates.branch_id'),
      { key: 'branches.code', value: 'hourly_cost_cents', on },
    ),
    litreCents: valid(
      db,
      sql('product_costs').join('products', 'products.id', 'product_costs.product_id'),
      { key: 'products.code', value: 'cost_per_litre_cents', on },
    ),
    pieceCents: valid(db, sql('consumable_costs'), { key: 'kind', value: 'unit_cost_cents', on }),
  };
}

/** The newest value of each key up to a day. */
function valid<Key extends string>(
  db: ScopedDb,
  query: Knex.QueryBuilder,
  { key, value, on }: { key: string; value: string; on: string },
): Map<Key, number> {
  // Oldest first, so that the newest is what stays.
  const rows = db.all<{ key: Key; value: number }>(
    query.where('from_date', '<=', on).orderBy('from_date').select({ key, value }),
  );
  return new Map(rows.map((row) => [row.key, row.value]));
}
