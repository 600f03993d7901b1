import type { Knex } from 'knex';
import type { ComeBackStatus } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { inOrder, leftFindings, toldInOrder } from './come-back-parts';
import type { ComeBackRow } from './come-back-row';
import { whereJobs, type JobFilters } from './job-filters';

/** Where a page of the list ended: what its last row was sorted by (rule 61). */
export interface ComeBackPlace {
  /** 0 structural and holed, 1 structural, 2 holed, 3 the rest. */
  danger: number;
  completedOn: string;
  branch: string;
  jobRef: string;
  /** Zone and side as a number in the order of the vocabulary. */
  place: number;
  ref: string;
}

/** Counts of all that match. */
export interface ComeBackTotals {
  findings: number;
  dangerous: number;
  dangerousNotTold: number;
  cars: number;
}

/** A page of what matches, and the counts of all of it. */
export interface LeftPage {
  rows: ComeBackRow[];
  totals: ComeBackTotals;
}

/**
 * Findings left on cars in scope that stand as asked, the dangerous first, from a place on; with the counts of all, because
 * working out how each finding stands is most of the work and is done once for both.
 */
export function listLeft(
  db: ScopedDb,
  filters: JobFilters,
  statuses: readonly ComeBackStatus[],
  after: ComeBackPlace | undefined,
  limit: number,
): LeftPage {
  const page = inOrder(sql.from('asked as c')).limit(limit).select('c.*');
  if (after) {
    page.whereRaw(
      '(c.danger, c.completed_on, c.branch, c.job_ref, c.place, c.ref) > (?, ?, ?, ?, ?, ?)',
      [after.danger, after.completedOn, after.branch, after.jobRef, after.place, after.ref],
    );
  }
  const found = db.all<ComeBackTotals & (ComeBackRow | { job_id: null })>(
    toldInOrder(
      sql
        .withMaterialized('asked', standing(db, filters, statuses).select('c.*'))
        .from(sql.from('asked').select(TOTALS).as('totals'))
        .joinRaw('left join ? on true', [sql.raw('?', [page.as('c')])]),
    ).select('totals.*'),
  );
  const { findings = 0, dangerous = 0, dangerousNotTold = 0, cars = 0 } = found[0] ?? {};
  return {
    // The counts come with a row of nothing where no finding is on the page.
    rows: found.filter((row): row is ComeBackTotals & ComeBackRow => row.job_id !== null),
    totals: { findings, dangerous, dangerousNotTold, cars },
  };
}

/** All of them, one at a time and in the same order, for an export. */
export function iterateLeft(
  db: ScopedDb,
  filters: JobFilters,
  statuses: readonly ComeBackStatus[],
): IterableIterator<ComeBackRow> {
  return db.iterate<ComeBackRow>(sorted(db, filters, statuses));
}

/** Rot where the car bears load: as `isDangerous` has it. */
const DANGEROUS = `structural = 1 and (seen_as <> 'surface' or coalesce(worked_as, 'surface') <> 'surface')`;

/** How many match, how many of them are dangerous, untold, and on how many cars they are. */
const TOTALS = {
  findings: sql.raw('count(*)'),
  dangerous: sql.raw(`count(*) filter (where ${DANGEROUS})`),
  dangerousNotTold: sql.raw(`count(*) filter (where ${DANGEROUS} and owner_told_on is null)`),
  // A car without a key is known by its job alone.
  cars: sql.raw(
    `count(distinct iif(vehicle_key is null, 'job ' || job_id, 'car ' || branch || ' ' || vehicle_key))`,
  ),
};

function sorted(
  db: ScopedDb,
  filters: JobFilters,
  statuses: readonly ComeBackStatus[],
): Knex.QueryBuilder {
  return toldInOrder(standing(db, filters, statuses));
}

/** The rows that stand as asked, worked out once whatever is then asked of them. */
function standing(
  db: ScopedDb,
  filters: JobFilters,
  statuses: readonly ComeBackStatus[],
): Knex.QueryBuilder {
  return sql
    .withMaterialized('left_findings', whereJobs(leftFindings(db), filters))
    .from('left_findings as c')
    .whereRaw('c.status in (select value from json_each(?))', [JSON.stringify(statuses)]);
}
