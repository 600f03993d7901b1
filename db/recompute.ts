import type { RecordedJob } from '#shared/domain/recorded-job';
import type { Connection } from './database';
import { deriveRows, type DerivedRows } from './derived-rows';
import { FACT_COLUMNS, type JobIdentity } from './queries/fact-row';
import type { Store } from './store';

interface RawJob extends Omit<JobIdentity, 'packageId'> {
  branchCode: string;
  content: string;
}

/** A job whose kept rows are not what its content and the present costs give. */
export interface Differing {
  jobId: number;
  kept: DerivedRows[];
  fresh: DerivedRows;
}

/** Computes the derived rows of every job anew from the raw revisions and returns those that differ from the visible ones: none, unless derivation has drifted. */
export function recomputeAll(store: Store): Differing[] {
  const { writing, state } = store;
  const differing: Differing[] = [];
  const ids = writing.driver
    .prepare(
      `select jobs.id as jobId, branch_id as branchId, branches.code as branchCode, job_ref as jobRef,
        jobs.revision, warranty_months as warrantyMonths, content
        from jobs join branches on branches.id = branch_id
        join job_revisions r on r.job_id = jobs.id and r.revision = jobs.revision
        where voided_at is null order by jobs.id`,
    )
    .all() as RawJob[];
  for (const row of ids) {
    const job = JSON.parse(row.content) as RecordedJob;
    const packageId = state.package(job.package)?.id;
    if (packageId === undefined) throw new Error('a recorded job names a package that is gone');
    const fresh = deriveRows({ ...row, packageId }, row.branchCode, job, state.costs, state);
    const kept = visibleRows(writing, row.jobId, state.generation);
    if (JSON.stringify(kept) !== JSON.stringify([{ ...fresh, products: byId(fresh.products) }])) {
      differing.push({ jobId: row.jobId, kept, fresh });
    }
  }
  return differing;
}

function visibleRows(connection: Connection, jobId: number, generation: number): DerivedRows[] {
  const facts = connection
    .prepare(
      `select ${FACT_COLUMNS.join(', ')} from job_facts
        where job_id = ? and gen_from <= ? and gen_to > ?`,
    )
    .all(jobId, generation, generation) as Record<string, DerivedRows['facts'][number]>[];
  // Looked for by everything that a product's row repeats of its job: one that differs is not found.
  const products = connection.prepare(
    `select product_id as productId, ml, cost_cents as costCents from job_products
      where branch_id = ? and completed_on = ? and job_id = ? and package_id = ? and body_type = ?
      and temperature_c is ? and gen_from <= ? and gen_to > ?`,
  );
  return facts.map((row) => {
    const car = {
      completedOn: String(row['completed_on']),
      bodyType: String(row['body_type']),
      temperatureC: row['temperature_c'] as number | null,
    };
    const found = products.all(
      row['branch_id'],
      car.completedOn,
      jobId,
      row['package_id'],
      car.bodyType,
      car.temperatureC,
      generation,
      generation,
    ) as DerivedRows['products'];
    return { facts: Object.values(row), car, products: byId(found) };
  });
}

function byId(products: DerivedRows['products']): DerivedRows['products'] {
  return [...products].sort((a, b) => a.productId - b.productId);
}
