import type { BodyType } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** Everything that went into the cars of one package and body type of one product, a car at the same place in both lists. */
export interface ProductLines {
  packageId: number;
  bodyType: BodyType;
  productId: number;
  ml: number[];
  temperatures: (number | null)[];
  /** Σ of the rounded line costs that were known, and how many lines that are. */
  costCents: number;
  costedLines: number;
}

/** Cars of one package and body type. */
export interface CarCell {
  packageId: number;
  bodyType: BodyType;
  cars: number;
}

/** Millilitres of one product that a norm foresees. */
export interface NormEntry {
  packageId: number;
  bodyType: BodyType;
  productId: number;
  ml: number;
}

/** Millilitres of the cars of a branch that have a norm: used of normed products, and foreseen. */
export interface NormedCars {
  branchId: number;
  used: number[];
  foreseen: number[];
}

/** The product lines of the jobs in scope and filters, a group a package, body type and product. */
export function readProductLines(db: ScopedDb, filters: JobFilters): ProductLines[] {
  // Lines lie by branch and day as the facts do and know their car, so the filters of facts fit them.
  return db
    .all<{ ml: string; temperatures: string } & Omit<ProductLines, 'ml' | 'temperatures'>>(
      whereJobs(db.table('job_products', 'job_facts'), filters)
        .groupBy('package_id', 'body_type', 'product_id')
        .select(
          { packageId: 'package_id', bodyType: 'body_type', productId: 'product_id' },
          sql.raw(
            `json_group_array(ml) as ml, json_group_array(temperature_c) as temperatures,
              coalesce(sum(cost_cents), 0) as "costCents", count(cost_cents) as "costedLines"`,
          ),
        ),
    )
    .map((row) => ({
      ...row,
      ml: JSON.parse(row.ml) as number[],
      temperatures: JSON.parse(row.temperatures) as (number | null)[],
    }));
}

/** How many cars of each package and body type there are. */
export function countCarCells(db: ScopedDb, filters: JobFilters): CarCell[] {
  return db.all<CarCell>(
    whereJobs(db.table('job_facts'), filters)
      .groupBy('package_id', 'body_type')
      .select({ packageId: 'package_id', bodyType: 'body_type' })
      .count({ cars: '*' }),
  );
}

/** The cars that have a norm, a row a branch. */
export function readNormedCars(db: ScopedDb, filters: JobFilters): NormedCars[] {
  return db
    .all<{ branchId: number; used: string; foreseen: string }>(
      whereJobs(db.table('job_facts'), filters)
        .where('norm_ml', '>', 0)
        .groupBy('branch_id')
        .select(
          { branchId: 'branch_id' },
          sql.raw('json_group_array(normed_ml) as used, json_group_array(norm_ml) as foreseen'),
        ),
    )
    .map(({ branchId, used, foreseen }) => ({
      branchId,
      used: JSON.parse(used) as number[],
      foreseen: JSON.parse(foreseen) as number[],
    }));
}

/** Jobs with a line whose cost was not known, and what their other lines cost. */
export function sumUncosted(
  db: ScopedDb,
  filters: JobFilters,
): { jobs: number; costCents: number } {
  const each = whereJobs(db.table('job_products', 'job_facts'), filters)
    .groupBy('branch_id', 'completed_on', 'job_id')
    .havingRaw('count(cost_cents) < count(*)')
    .select(sql.raw('coalesce(sum(cost_cents), 0) as cents'));
  const row = db.first<{ jobs: number; costCents: number }>(
    sql
      .from(each.as('uncosted'))
      .select(sql.raw('count(*) as jobs, coalesce(sum(cents), 0) as "costCents"')),
  );
  return row ?? { jobs: 0, costCents: 0 };
}

/** Products whose cost was not known where they went in, each with the earliest such day (rule 11). */
export function listUncostedProducts(
  db: ScopedDb,
  filters: JobFilters,
): { code: string; on: string }[] {
  return db.all(
    whereJobs(db.table('job_products', 'job_facts'), filters)
      .join('products', 'products.id', 'job_facts.product_id')
      .whereNull('cost_cents')
      .groupBy('products.code')
      .orderBy('products.code')
      .select({ code: 'products.code' })
      .min({ on: 'completed_on' }),
  );
}

/** Every norm there is, a line a product. */
export function readNorms(db: ScopedDb): NormEntry[] {
  return db.all<NormEntry>(
    sql('norms').select(
      { packageId: 'package_id', bodyType: 'body_type', productId: 'product_id' },
      'ml',
    ),
  );
}

/** The code of every product by its id. */
export function productCodes(db: ScopedDb): Map<number, string> {
  const rows = db.all<{ id: number; code: string }>(sql('products').select('id', 'code'));
  return new Map(rows.map(({ id, code }) => [id, code]));
}
