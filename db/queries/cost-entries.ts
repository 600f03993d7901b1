import type { Knex } from 'knex';
import type { CostChange } from '#shared/domain/cost-book';
import type { BodyType, ConsumableKind } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { NetworkReader } from './audit';

interface DatedRow<Code extends string = string> {
  code: Code;
  from: string;
  value: number;
}

/** Every dated cost and norm that is set: what a cost book is made of. `rates` are the hourly costs that the reader may see. */
export function listCostEntries(db: NetworkReader, rates: Knex.QueryBuilder): CostChange[] {
  const hourly = db.all<DatedRow>(
    rates
      .join('branches', 'branches.id', 'branch_rates.branch_id')
      .select('branches.code', { from: 'from_date', value: 'hourly_cost_cents' }),
  );
  const products = db.all<DatedRow>(
    sql('product_costs')
      .join('products', 'products.id', 'product_costs.product_id')
      .select('products.code', { from: 'from_date', value: 'cost_per_litre_cents' }),
  );
  const consumables = db.all<DatedRow<ConsumableKind>>(
    sql('consumable_costs').select({ code: 'kind', from: 'from_date', value: 'unit_cost_cents' }),
  );
  const fees = db.all<Omit<DatedRow, 'code'>>(
    sql('network_fees').select({ from: 'from_date', value: 'fee_micros' }),
  );
  return [
    ...hourly.map((row) => ({ kind: 'hourlyCost' as const, ...row })),
    ...products.map((row) => ({ kind: 'product' as const, ...row })),
    ...consumables.map((row) => ({ kind: 'consumable' as const, ...row })),
    ...fees.map((row) => ({ kind: 'fee' as const, ...row })),
    ...listNormEntries(db),
  ];
}

function listNormEntries(db: NetworkReader): CostChange[] {
  const lines = db.all<{ package: string; bodyType: BodyType; product: string; ml: number }>(
    sql('norms')
      .join('packages', 'packages.id', 'norms.package_id')
      .join('products', 'products.id', 'norms.product_id')
      .orderBy(['packages.code', 'body_type', 'products.code'])
      .select({ package: 'packages.code', bodyType: 'body_type', product: 'products.code' }, 'ml'),
  );
  const norms = new Map<string, Extract<CostChange, { kind: 'norm' }>>();
  for (const { product, ml, ...key } of lines) {
    const name = `${key.package} ${key.bodyType}`;
    const norm = norms.get(name) ?? { kind: 'norm' as const, ...key, lines: [] };
    norm.lines.push({ product, ml });
    norms.set(name, norm);
  }
  return [...norms.values()];
}
