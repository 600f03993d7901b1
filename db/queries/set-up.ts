import type { CostChange } from '#shared/domain/cost-book';
import type { ProductKind } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';
import type { BranchRow, RegionRow } from './catalogue';

/** Writes of set-up; each runs inside `WriteQueue.write` and says whether the row is new. */
export type Put = 'created' | 'changed';

export function putRegionRow(db: UnscopedDb, region: RegionRow): Put {
  return upsert(
    db,
    'regions',
    { code: region.code },
    {
      name: region.name,
      temperature_c: region.climate?.temperatureC ?? null,
      humidity_pct: region.climate?.humidityPct ?? null,
      so2_deposition: region.climate?.so2Deposition ?? null,
      chloride_deposition: region.climate?.chlorideDeposition ?? null,
    },
  );
}

export function putBranchRow(db: UnscopedDb, branch: BranchRow): Put {
  return upsert(
    db,
    'branches',
    { code: branch.code },
    {
      name: branch.name,
      region_id: idOf(db, 'regions', branch.region),
      time_zone: branch.timeZone,
      opened_on: branch.openedOn,
      closed_on: branch.closedOn,
      target_margin_share: branch.targetMarginShare,
    },
  );
}

export function putProductRow(
  db: UnscopedDb,
  product: { code: string; name: string; kind: ProductKind },
): Put {
  return upsert(db, 'products', { code: product.code }, { name: product.name, kind: product.kind });
}

export function putPackageRow(
  db: UnscopedDb,
  entry: { code: string; name: string; warrantyMonths: number },
): Put {
  return upsert(
    db,
    'packages',
    { code: entry.code },
    {
      name: entry.name,
      warranty_months: entry.warrantyMonths,
    },
  );
}

/** Writes a dated cost or a norm. */
export function putCost(db: UnscopedDb, change: CostChange): Put {
  switch (change.kind) {
    case 'hourlyCost':
      return upsert(
        db,
        'branch_rates',
        { branch_id: idOf(db, 'branches', change.code), from_date: change.from },
        { hourly_cost_cents: change.value },
      );
    case 'product':
      return upsert(
        db,
        'product_costs',
        { product_id: idOf(db, 'products', change.code), from_date: change.from },
        { cost_per_litre_cents: change.value },
      );
    case 'consumable':
      return upsert(
        db,
        'consumable_costs',
        { kind: change.code, from_date: change.from },
        { unit_cost_cents: change.value },
      );
    case 'fee':
      return upsert(db, 'network_fees', { from_date: change.from }, { fee_micros: change.value });
    case 'norm':
      return putNorm(db, change);
  }
}

function putNorm(db: UnscopedDb, change: Extract<CostChange, { kind: 'norm' }>): Put {
  const key = { package_id: idOf(db, 'packages', change.package), body_type: change.bodyType };
  const { changes } = db.run(sql('norms').where(key).delete());
  for (const { product, ml } of change.lines) {
    db.run(sql('norms').insert({ ...key, product_id: idOf(db, 'products', product), ml }));
  }
  return changes > 0 ? 'changed' : 'created';
}

function upsert(
  db: UnscopedDb,
  table: string,
  key: Record<string, string | number>,
  values: Record<string, string | number | null>,
): Put {
  const { changes } = db.run(sql(table).where(key).update(values));
  if (changes > 0) return 'changed';
  db.run(sql(table).insert({ ...key, ...values }));
  return 'created';
}

function idOf(
  db: UnscopedDb,
  table: 'regions' | 'branches' | 'products' | 'packages',
  code: string,
): number {
  const row = db.first<{ id: number }>(sql(table).where({ code }).select('id'));
  if (!row) throw new Error(`no row of ${table} has the code asked for`);
  return row.id;
}
