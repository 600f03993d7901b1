import Database from 'better-sqlite3';
import path from 'node:path';

/** A job as its branch sent it last: the stored text, read without the product. */
export interface RawJob {
  branch: string;
  jobRef: string;
  revision: number;
  job: {
    vehicle: { make: string; model: string; bodyType: string; firstRegistered: string };
    package: string;
    completedOn: string;
    estimate?: { priceCents: number; stages: Record<string, number> };
    agreedExtras?: { minutes?: number; priceCents?: number }[];
    actual: { stages: Record<string, number> };
    products?: { product: string; ml: number }[];
    consumables?: { kind: string; quantity: number; unitCostCents?: number }[];
    boughtInCents?: number;
    invoice?: { totalCents: number };
  };
}

/** What things cost from a date on. */
export interface RawCosts {
  /** Hourly labour by branch, litre by product, piece by kind of consumable, in cents; the fee in millionths of revenue. */
  hourly: Dated;
  litre: Dated;
  piece: Dated;
  fee: Dated;
  /** Norms by package and body type. */
  norms: Map<string, { product: string; ml: number }[]>;
}

/** By code, the dates from which a cost is valid, newest first. */
export type Dated = Map<string, { from: string; cost: bigint }[]>;

/** Reads the newest revision of every job that was not voided, and every dated cost, straight from the data folder. */
export function readRawRecord(data: string): { jobs: RawJob[]; costs: RawCosts } {
  const file = new Database(path.join(data, 'underseam.sqlite'), { readonly: true });
  try {
    const rows = file
      .prepare(
        `select branches.code as branch, job_ref as jobRef, jobs.revision as revision, content
           from jobs join branches on branches.id = branch_id
           join job_revisions on job_id = jobs.id
          where voided_at is null and job_revisions.revision =
            (select max(revision) from job_revisions as every where every.job_id = jobs.id)`,
      )
      .all() as { branch: string; jobRef: string; revision: number; content: string }[];
    const jobs = rows.map(({ branch, jobRef, revision, content }) => ({
      branch,
      jobRef,
      revision,
      job: JSON.parse(content) as RawJob['job'],
    }));
    return { jobs, costs: readCosts(file) };
  } finally {
    file.close();
  }
}

function readCosts(file: Database.Database): RawCosts {
  const dated = (text: string): Dated => {
    const all: Dated = new Map();
    const rows = file.prepare(text).all() as { code: string; start: string; cost: number }[];
    for (const { code, start, cost } of rows) {
      all.set(code, [...(all.get(code) ?? []), { from: start, cost: BigInt(cost) }]);
    }
    for (const costs of all.values()) costs.sort((a, b) => (a.from < b.from ? 1 : -1));
    return all;
  };
  const norms: RawCosts['norms'] = new Map();
  const lines = file
    .prepare(
      `select packages.code as package, body_type as bodyType, products.code as product, ml
         from norms join packages on packages.id = package_id
         join products on products.id = product_id`,
    )
    .all() as { package: string; bodyType: string; product: string; ml: number }[];
  for (const { package: sold, bodyType, product, ml } of lines) {
    const key = `${sold} ${bodyType}`;
    norms.set(key, [...(norms.get(key) ?? []), { product, ml }]);
  }
  return {
    hourly: dated(`select code, from_date as start, hourly_cost_cents as cost
      from branch_rates join branches on branches.id = branch_id`),
    litre: dated(`select code, from_date as start, cost_per_litre_cents as cost
      from product_costs join products on products.id = product_id`),
    piece: dated(
      `select kind as code, from_date as start, unit_cost_cents as cost from consumable_costs`,
    ),
    fee: dated(
      `select 'network' as code, from_date as start, fee_micros as cost from network_fees`,
    ),
    norms,
  };
}
