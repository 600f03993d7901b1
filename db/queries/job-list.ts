import type { Knex } from 'knex';
import { folded } from '#shared/domain/recorded-job';
import type { BodyType } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { whereJobs, type JobFilters } from './job-filters';

export type JobSort = 'completed' | 'margin' | 'difference' | 'overrun' | 'waiting';

/** Filters of the list beyond those every figure takes. */
export interface ListFilters extends JobFilters {
  make?: string | undefined;
  model?: string | undefined;
  ageBandIndex?: number | undefined;
  unbilled?: boolean | undefined;
  hasRot?: boolean | undefined;
  hasEstimate?: boolean | undefined;
  /** Places as `placesMask` gives them: cars with rot in any of these. */
  rotPlaces?: number | undefined;
  /** A product that went in or, with `productUse`, went in too little or too much of against its norm. */
  productId?: number | undefined;
  productUse?: 'under' | 'over' | undefined;
  /** Plain text, looked for in reference, make and model without regard to case. */
  text?: string | undefined;
}

/** Where a page of the list ended: the values its last row was sorted by. */
export interface ListPlace {
  key: number;
  completedOn: string;
  branch: string;
  jobRef: string;
}

/** A row as stored, before it is told. */
export interface ListedJob {
  sortKey: number;
  branch: string;
  job_ref: string;
  revision: number;
  vehicle_key: string | null;
  make: string;
  model: string;
  body_type: BodyType;
  first_registered: string;
  package: string;
  completed_on: string;
  has_rot: number;
  billed: number;
  has_estimate: number;
  est_minutes: number;
  act_minutes: number;
  charged_repair_minutes: number;
  extra_minutes: number;
  extra_cents: number;
  costed: number;
  expected: number;
  revenue_cents: number;
  labour_cents: number;
  repair_labour_cents: number;
  product_cents: number;
  consumables_cents: number;
  bought_in_cents: number;
  fee_cents: number;
  exp_price_cents: number;
  exp_labour_cents: number;
  exp_repair_labour_cents: number;
  exp_product_cents: number;
  exp_fee_cents: number;
}

/** Sorts behind every real value. */
const LAST = '9007199254740991';

/** Each sort as one value that rises; rows it says nothing of come last. */
const SORT_KEYS: Record<JobSort, string> = {
  completed: '0',
  margin: `case when billed = 1 and costed = 1 then margin_cents else ${LAST} end`,
  difference: `case when billed = 1 and costed = 1 and expected = 1 then margin_cents - exp_margin_cents else ${LAST} end`,
  overrun: `case when has_estimate = 1 then est_minutes - act_minutes else ${LAST} end`,
  waiting: `case when billed = 0 then cast(replace(completed_on, '-', '') as integer) else ${LAST} end`,
};

const COLUMNS = [
  ...['job_ref', 'revision', 'vehicle_key', 'make', 'model', 'body_type', 'first_registered'],
  ...['completed_on', 'has_rot', 'billed', 'has_estimate', 'est_minutes', 'act_minutes'],
  ...['charged_repair_minutes', 'extra_minutes', 'extra_cents', 'costed', 'expected'],
  ...['revenue_cents', 'labour_cents', 'repair_labour_cents', 'product_cents'],
  ...['consumables_cents', 'bought_in_cents', 'fee_cents', 'exp_price_cents', 'exp_labour_cents'],
  ...['exp_repair_labour_cents', 'exp_product_cents', 'exp_fee_cents'],
];

/** Jobs in scope that match, sorted, from a place on. Ties go by newest completion, branch, reference (rule 67). */
export function listJobRows(
  db: ScopedDb,
  filters: ListFilters,
  sort: JobSort,
  after: ListPlace | undefined,
  limit: number,
): ListedJob[] {
  const query = sortedJobs(db, filters, sort).limit(limit);
  if (after) {
    const key = SORT_KEYS[sort];
    query.whereRaw(
      `(${key} > ? or (${key} = ? and (completed_on < ? or (completed_on = ? and (branches.code, job_ref) > (?, ?)))))`,
      [after.key, after.key, after.completedOn, after.completedOn, after.branch, after.jobRef],
    );
  }
  return db.all<ListedJob>(query);
}

/** All of them, one at a time and in the same order, for an export. */
export function iterateJobRows(
  db: ScopedDb,
  filters: ListFilters,
  sort: JobSort,
): IterableIterator<ListedJob> {
  return db.iterate<ListedJob>(sortedJobs(db, filters, sort));
}

/** How many jobs match. */
export function countJobs(db: ScopedDb, filters: ListFilters): number {
  const row = db.first<{ jobs: number }>(
    whereListed(db, db.table('job_facts'), filters).count({ jobs: '*' }),
  );
  return row?.jobs ?? 0;
}

function sortedJobs(db: ScopedDb, filters: ListFilters, sort: JobSort): Knex.QueryBuilder {
  return (
    whereListed(db, db.table('job_facts'), filters)
      .join('branches', 'branches.id', 'job_facts.branch_id')
      .join('packages', 'packages.id', 'job_facts.package_id')
      // By its alias: a constant key written out would be read as the number of a column.
      .orderByRaw('"sortKey", completed_on desc, branches.code, job_ref')
      .select(
        ...COLUMNS.map((column) => `job_facts.${column}`),
        { branch: 'branches.code', package: 'packages.code' },
        sql.raw(`${SORT_KEYS[sort]} as "sortKey"`),
      )
  );
}

function whereListed(
  db: ScopedDb,
  query: Knex.QueryBuilder,
  filters: ListFilters,
): Knex.QueryBuilder {
  whereJobs(query, filters);
  // model_key is the folded make, a unit separator, the folded model.
  if (filters.make !== undefined) {
    const start = `${folded(filters.make)}\u001f`;
    query.whereRaw('substr(model_key, 1, length(?)) = ?', [start, start]);
  }
  if (filters.model !== undefined) {
    const end = `\u001f${folded(filters.model)}`;
    query.whereRaw('substr(model_key, -length(?)) = ?', [end, end]);
  }
  if (filters.ageBandIndex !== undefined) query.where('age_band', filters.ageBandIndex);
  if (filters.unbilled !== undefined) query.where('billed', filters.unbilled ? 0 : 1);
  if (filters.hasRot !== undefined) query.where('has_rot', filters.hasRot ? 1 : 0);
  if (filters.hasEstimate !== undefined) {
    query.where('has_estimate', filters.hasEstimate ? 1 : 0);
  }
  if (filters.rotPlaces !== undefined) {
    query.whereRaw('rot_zones & cast(? as integer) <> 0', [filters.rotPlaces]);
  }
  if (filters.productId !== undefined) {
    whereProduct(db, query, filters.productId, filters.productUse);
  }
  const text = filters.text === undefined ? '' : folded(filters.text);
  if (text !== '') query.whereRaw('instr(search_text, ?) > 0', [text]);
  return query;
}

/** The edges of rule 37 in whole numbers: strictly under 70 %, strictly over 130 % of the norm. */
const EDGES = { under: '10 * used < 7 * norm', over: '10 * used > 13 * norm' };

/** Cars by what they took of a product; against its norm a car that lists nothing of it took 0 ml (rule 37). */
function whereProduct(
  db: ScopedDb,
  query: Knex.QueryBuilder,
  productId: number,
  use: ListFilters['productUse'],
): void {
  const used = `select ml from ? where job_products.branch_id = job_facts.branch_id
    and job_products.completed_on = job_facts.completed_on
    and job_products.job_id = job_facts.job_id and product_id = ?`;
  const bindings = [db.derived('job_products'), productId];
  if (use === undefined) {
    query.whereRaw(`exists (${used} and ml > 0)`, bindings);
    return;
  }
  query.whereRaw(
    `exists (select coalesce((${used}), 0) as used, norms.ml as norm from norms
      where norms.package_id = job_facts.package_id and norms.body_type = job_facts.body_type
        and norms.product_id = ? and ${EDGES[use]})`,
    [...bindings, productId],
  );
}
