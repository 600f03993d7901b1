import type { BodyType, ConsumableKind, ProductKind } from '#shared/domain/vocabulary';
import { rateOfMicros } from '#shared/domain/money';
import { FROM_THE_START } from '#shared/domain/cost-book';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import type { UnscopedDb } from '../unscoped-db';

export interface RegionRow {
  code: string;
  name: string;
  climate: {
    temperatureC: number;
    humidityPct: number;
    so2Deposition: number;
    chlorideDeposition: number;
  } | null;
}

export interface BranchRow {
  code: string;
  name: string;
  region: string;
  timeZone: string;
  openedOn: string;
  closedOn: string | null;
  targetMarginShare: number | null;
}

interface FlatRegion {
  code: string;
  name: string;
  temperature_c: number | null;
  humidity_pct: number | null;
  so2_deposition: number | null;
  chloride_deposition: number | null;
}

/** Regions of the given codes, in code order. */
export function listRegions(db: UnscopedDb, codes: readonly string[]): RegionRow[] {
  return db
    .all<FlatRegion>(
      sql('regions')
        .whereIn('code', [...codes])
        .orderBy('code'),
    )
    .map(regionOf);
}

/** Every region there is, those without a branch too; for who sees the whole network. */
export function listAllRegions(db: UnscopedDb): RegionRow[] {
  return db.all<FlatRegion>(sql('regions').orderBy('code')).map(regionOf);
}

export function findRegion(db: UnscopedDb, code: string): RegionRow | undefined {
  return listRegions(db, [code])[0];
}

function regionOf(row: FlatRegion): RegionRow {
  const { temperature_c, humidity_pct, so2_deposition, chloride_deposition } = row;
  const climate =
    temperature_c === null ||
    humidity_pct === null ||
    so2_deposition === null ||
    chloride_deposition === null
      ? null
      : {
          temperatureC: temperature_c,
          humidityPct: humidity_pct,
          so2Deposition: so2_deposition,
          chlorideDeposition: chloride_deposition,
        };
  return { code: row.code, name: row.name, climate };
}

/** Branches of the given codes, in code order. */
export function listBranches(db: UnscopedDb, codes: readonly string[]): BranchRow[] {
  return db.all<BranchRow>(
    sql('branches')
      .join('regions', 'regions.id', 'branches.region_id')
      .whereIn('branches.code', [...codes])
      .orderBy('branches.code')
      .select('branches.code', 'branches.name', {
        region: 'regions.code',
        timeZone: 'time_zone',
        openedOn: 'opened_on',
        closedOn: 'closed_on',
        targetMarginShare: 'target_margin_share',
      }),
  );
}

export function findBranch(db: UnscopedDb, code: string): BranchRow | undefined {
  return listBranches(db, [code])[0];
}

export function listPackages(
  db: UnscopedDb,
): { code: string; name: string; warrantyMonths: number }[] {
  return db.all(
    sql('packages').orderBy('code').select('code', 'name', { warrantyMonths: 'warranty_months' }),
  );
}

export function listProducts(db: UnscopedDb): { code: string; name: string; kind: ProductKind }[] {
  return db.all(sql('products').orderBy('code').select('code', 'name', 'kind'));
}

/** Every norm, its products in code order. */
export function listNorms(
  db: UnscopedDb,
): { package: string; bodyType: BodyType; product: string; ml: number }[] {
  return db.all(
    sql('norms')
      .join('packages', 'packages.id', 'norms.package_id')
      .join('products', 'products.id', 'norms.product_id')
      .orderBy(['packages.code', 'body_type', 'products.code'])
      .select({ package: 'packages.code', bodyType: 'body_type', product: 'products.code' }, 'ml'),
  );
}

/** Fee rates by date; `from` is null for the one valid from the start. */
export function listFees(db: UnscopedDb): { from: string | null; feeRate: number }[] {
  return db
    .all<{ from: string; micros: number }>(
      sql('network_fees').orderBy('from_date').select({ from: 'from_date', micros: 'fee_micros' }),
    )
    .map(({ from, micros }) => ({
      from: from === FROM_THE_START ? null : from,
      feeRate: rateOfMicros(micros),
    }));
}

export function listProductCosts(
  db: UnscopedDb,
): { product: string; from: string; costPerLitreCents: number }[] {
  return db.all(
    sql('product_costs')
      .join('products', 'products.id', 'product_costs.product_id')
      .orderBy(['products.code', 'from_date'])
      .select({
        product: 'products.code',
        from: 'from_date',
        costPerLitreCents: 'cost_per_litre_cents',
      }),
  );
}

export function listConsumableCosts(
  db: UnscopedDb,
): { kind: ConsumableKind; from: string; unitCostCents: number }[] {
  return db.all(
    sql('consumable_costs')
      .orderBy(['kind', 'from_date'])
      .select('kind', { from: 'from_date', unitCostCents: 'unit_cost_cents' }),
  );
}

/** Hourly costs of the branches in scope. */
export function listRates(
  db: ScopedDb,
): { branch: string; from: string; hourlyCostCents: number }[] {
  return db.all(
    db
      .table('branch_rates')
      .join('branches', 'branches.id', 'branch_rates.branch_id')
      .orderBy(['branches.code', 'from_date'])
      .select({ branch: 'branches.code', from: 'from_date', hourlyCostCents: 'hourly_cost_cents' }),
  );
}
