import type { Period } from '#shared/domain/period';
import type { BodyType } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

/** Cars of a branch of one package and body type. */
export interface BranchCell {
  branchId: number;
  packageId: number;
  bodyType: BodyType;
  cars: number;
}

/** Σ and Σ of squares of the millilitres that went into the cars of such a cell that list a product; whole numbers. */
export interface CellSums {
  branchId: number;
  packageId: number;
  bodyType: BodyType;
  productId: number;
  sum: number;
  squares: number;
}

/** Since when a branch has sent jobs, and when it closed. */
export interface BranchLife {
  branchId: number;
  firstOn: string | null;
  closedOn: string | null;
}

type AskedOf = Pick<JobFilters, 'packageIds' | 'bodyTypes'>;

/** How many cars each branch had in each week of some days. */
export function countBranchWeeks(
  db: ScopedDb,
  filters: JobFilters,
): { branchId: number; week: string; cars: number }[] {
  return db.all(
    whereJobs(db.table('job_facts'), filters)
      .groupBy('branch_id', 'week')
      .select({ branchId: 'branch_id', week: 'week' })
      .count({ cars: '*' }),
  );
}

/** How many cars of each package and body type each branch had. */
export function countBranchCells(db: ScopedDb, filters: JobFilters): BranchCell[] {
  return db.all<BranchCell>(
    whereJobs(db.table('job_facts'), filters)
      .groupBy('branch_id', 'package_id', 'body_type')
      .select({ branchId: 'branch_id', packageId: 'package_id', bodyType: 'body_type' })
      .count({ cars: '*' }),
  );
}

/** What went into those cars, by product. */
export function sumBranchCells(db: ScopedDb, filters: JobFilters): CellSums[] {
  return db.all<CellSums>(
    whereJobs(db.table('job_products', 'job_facts'), filters)
      .groupBy('branch_id', 'package_id', 'body_type', 'product_id')
      .select(
        { branchId: 'branch_id', packageId: 'package_id', bodyType: 'body_type' },
        { productId: 'product_id' },
        sql.raw('sum(ml) as sum, sum(ml * ml) as squares'),
      ),
  );
}

/** Cars in the diaries of the branches, by day, package and body type. */
export function countBookings(
  db: ScopedDb,
  days: Period,
  { packageIds, bodyTypes }: AskedOf,
): (BranchCell & { on: string })[] {
  // Bookings name package and body type as facts do, so those filters fit them.
  return db.all(
    whereJobs(db.table('bookings', 'job_facts'), { packageIds, bodyTypes })
      .where('expected_on', '>=', days.from)
      .where('expected_on', '<=', days.to)
      .groupBy('branch_id', 'expected_on', 'package_id', 'body_type')
      .select({ branchId: 'branch_id', packageId: 'package_id', bodyType: 'body_type' })
      .select({ on: 'expected_on' })
      .count({ cars: '*' }),
  );
}

/** The life of every branch in scope. */
export function listBranchLives(db: ScopedDb): BranchLife[] {
  const first = db
    .table('job_facts')
    .whereRaw('job_facts.branch_id = branches.id')
    .orderBy('completed_on')
    .limit(1)
    .select('completed_on');
  return db.all<BranchLife>(
    sql('branches')
      .whereRaw('branches.id in (select value from json_each(?))', [db.scope.idsJson])
      .select({ branchId: 'branches.id', closedOn: 'closed_on' }, first.as('firstOn')),
  );
}
