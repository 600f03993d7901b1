import type { CostBook } from '#shared/domain/cost-book';
import { deriveFigures, type JobFigures } from '#shared/domain/job-figures';
import type { RecordedJob } from '#shared/domain/recorded-job';
import type { Connection } from './database';
import type { NetworkState } from './network-state';
import { FACT_COLUMNS, factValues, type FactValue, type JobIdentity } from './queries/fact-row';
import { NO_END } from './tables';

const INSERT_FACTS = `insert into job_facts (gen_from, gen_to, ${FACT_COLUMNS.join(', ')})
  values (?, ?, ${FACT_COLUMNS.map(() => '?').join(', ')})`;
const INSERT_PRODUCT = `insert into job_products (branch_id, completed_on, job_id, product_id, gen_from,
  gen_to, package_id, body_type, temperature_c, ml, cost_cents) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`;
/** Products lie by branch and day like the facts, and are found through them. */
const PRODUCTS_OF = `(branch_id, completed_on, job_id) in
  (select branch_id, completed_on, job_id from job_facts where job_id = ?)`;

/** The rows that follow from a job's content and a cost book. */
export interface DerivedRows {
  facts: FactValue[];
  /** What a product's row repeats of its job. */
  car: { completedOn: string; bodyType: string; temperatureC: number | null };
  products: { productId: number; ml: number; costCents: number | null }[];
}

/** Derives the rows of a job; the one place where content and costs become rows. */
export function deriveRows(
  id: JobIdentity,
  branchCode: string,
  job: RecordedJob,
  costs: CostBook,
  state: Pick<NetworkState, 'productId'>,
): DerivedRows {
  const figures = deriveFigures(job, branchCode, costs);
  return {
    facts: factValues(id, job, figures),
    car: {
      completedOn: job.completedOn,
      bodyType: job.vehicle.bodyType,
      temperatureC: job.workshop?.temperatureC ?? null,
    },
    products: productRows(figures, state),
  };
}

/** Writes the rows of a job as visible from one generation up to (not including) another. */
export function insertDerived(
  connection: Connection,
  id: JobIdentity,
  rows: DerivedRows,
  window: { from: number; to: number },
): void {
  connection.prepare(INSERT_FACTS).run(window.from, window.to, ...rows.facts);
  const insert = connection.prepare(INSERT_PRODUCT);
  const { car } = rows;
  for (const { productId, ml, costCents } of rows.products) {
    insert.run(
      id.branchId,
      car.completedOn,
      id.jobId,
      productId,
      window.from,
      window.to,
      id.packageId,
      car.bodyType,
      car.temperatureC,
      ml,
      costCents,
    );
  }
}

/**
 * Writes the derived rows of a job that has just been received: one row in the visible generation, and a second one for the
 * generation being built when a restatement is under way and the new costs change it.
 */
export function insertReceived(
  connection: Connection,
  id: JobIdentity,
  branchCode: string,
  job: RecordedJob,
  state: NetworkState,
): void {
  const now = deriveRows(id, branchCode, job, state.costs, state);
  const { generation } = state;
  if (!state.nextCosts) {
    insertDerived(connection, id, now, { from: generation, to: NO_END });
    return;
  }
  const next = deriveRows(id, branchCode, job, state.nextCosts, state);
  if (sameRows(now, next)) {
    insertDerived(connection, id, now, { from: generation, to: NO_END });
    return;
  }
  insertDerived(connection, id, now, { from: generation, to: generation + 1 });
  insertDerived(connection, id, next, { from: generation + 1, to: NO_END });
}

/** Removes every derived row of a job, in all generations. */
export function removeDerived(connection: Connection, jobId: number): void {
  connection.prepare(`delete from job_products where ${PRODUCTS_OF}`).run(jobId);
  connection.prepare('delete from job_facts where job_id = ?').run(jobId);
}

/** Ends the rows of a job that have no end yet: visible before a generation, no more in it. */
export function endDerived(connection: Connection, jobId: number, generation: number): void {
  connection
    .prepare(`update job_products set gen_to = ? where gen_to = ? and ${PRODUCTS_OF}`)
    .run(generation, NO_END, jobId);
  connection
    .prepare('update job_facts set gen_to = ? where gen_to = ? and job_id = ?')
    .run(generation, NO_END, jobId);
}

/** Removes the rows of some jobs (ids above one, up to another) that ended at or before a generation. */
export function sweepDerived(
  connection: Connection,
  generation: number,
  jobs: { after: number; to: number },
): void {
  connection
    .prepare(
      `delete from job_products where gen_to <= ? and (branch_id, completed_on, job_id) in (
        select branch_id, completed_on, job_id from job_facts
          where job_id > ? and job_id <= ? and gen_to <= ?)`,
    )
    .run(generation, jobs.after, jobs.to, generation);
  connection
    .prepare('delete from job_facts where job_id > ? and job_id <= ? and gen_to <= ?')
    .run(jobs.after, jobs.to, generation);
}

/** Whether two derivations of one job are the same rows. */
export function sameRows(a: DerivedRows, b: DerivedRows): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

function productRows(
  figures: JobFigures,
  state: Pick<NetworkState, 'productId'>,
): DerivedRows['products'] {
  return [...figures.products].map(([code, { ml, costCents }]) => {
    const productId = state.productId(code);
    if (productId === undefined) throw new Error('a recorded job names a product that is gone');
    return { productId, ml, costCents };
  });
}
