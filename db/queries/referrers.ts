import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import type { UnscopedDb } from '../unscoped-db';

/** A row of the catalogue that may be taken out. */
export interface CatalogueRow {
  kind: 'product' | 'package';
  code: string;
}

/** How much refers to a row of the catalogue. */
export interface Referrers {
  /** Jobs that name it in any revision, voided ones too: the record must stay readable. */
  jobs: number;
  underWay: number;
  norms: number;
  costs: number;
  bookings: number;
  /** The newest revision that was looked at. */
  lastRevision: number;
}

/** Counts what refers to a product or a package. Reads every revision: for a worker. */
export function countReferrers(db: ScopedDb, row: CatalogueRow): Referrers {
  const count = (query: Parameters<ScopedDb['first']>[0]): number =>
    db.first<{ n: number }>(query)?.n ?? 0;
  const named = mention(row);
  const column = `${row.kind}_id`;
  const id = sql(`${row.kind}s`).where({ code: row.code }).select('id');
  const jobs = db
    .table('jobs')
    .join('job_revisions', 'job_revisions.job_id', 'jobs.id')
    .whereRaw('instr(job_revisions.content, ?) > 0', [named])
    .countDistinct({ n: 'jobs.id' });
  return {
    lastRevision: count(
      db
        .table('jobs')
        .join('job_revisions', 'job_revisions.job_id', 'jobs.id')
        .max({ n: 'job_revisions.id' }),
    ),
    jobs: count(jobs),
    underWay: count(
      db.table('jobs_under_way').whereRaw('instr(content, ?) > 0', [named]).count({ n: '*' }),
    ),
    norms: count(
      sql
        .from(sql('norms').distinct('package_id', 'body_type').whereIn(column, id).as('norms'))
        .count({ n: '*' }),
    ),
    costs:
      row.kind === 'product'
        ? count(sql('product_costs').whereIn(column, id).count({ n: '*' }))
        : 0,
    bookings:
      row.kind === 'package'
        ? count(db.table('bookings').whereIn(column, id).count({ n: '*' }))
        : 0,
  };
}

/** Whether a revision that came later names it; inside the write that takes it out. */
export function isNamedSince(db: UnscopedDb, row: CatalogueRow, lastRevision: number): boolean {
  const later = db
    .prepare('select 1 from job_revisions where id > ? and instr(content, ?) > 0 limit 1')
    .get(lastRevision, mention(row));
  return later !== undefined;
}

/** Takes it out, inside a write; false when something refers to it after all. */
export function deleteCatalogueRow(db: UnscopedDb, { kind, code }: CatalogueRow): boolean {
  try {
    return db.run(sql(`${kind}s`).where({ code }).delete()).changes > 0;
  } catch (error) {
    if ((error as { code?: unknown }).code === 'SQLITE_CONSTRAINT_FOREIGNKEY') return false;
    throw error;
  }
}

/** How a recorded job names it. Quotes within a text are escaped there, so that no note looks like this. */
function mention({ kind, code }: CatalogueRow): string {
  return `"${kind}":${JSON.stringify(code)}`;
}
