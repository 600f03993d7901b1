import type { RecordedJob, StageMinutes } from '#shared/domain/recorded-job';
import type { Store } from '#db/store';

/** A job's money counted afresh, in cents: a second opinion that shares no arithmetic with the product. */
export interface Recount {
  /** Undefined when a cost of the job's own is missing. */
  margin: bigint | undefined;
  /** Undefined without an estimate, a norm or a cost that either needs. */
  expectedMargin: bigint | undefined;
}

/** x / d rounded half up, for whole x ≥ 0. */
const halfUp = (x: bigint, d: bigint): bigint => (2n * x + d) / (2n * d);

/** Counts a job from its content and the tables of costs themselves. */
export function recountJob(store: Store, branch: string, job: RecordedJob): Recount {
  const on = job.completedOn;
  const driver = store.writing.driver;
  const one = (text: string, ...values: unknown[]): bigint | undefined => {
    const found = driver
      .prepare(text)
      .pluck()
      .get(...values) as number | undefined;
    return found === undefined ? undefined : BigInt(found);
  };
  const latest = 'from_date <= ? order by from_date desc limit 1';
  const hourly = one(
    `select hourly_cost_cents from branch_rates join branches on branches.id = branch_id
      where code = ? and ${latest}`,
    branch,
    on,
  );
  const fee = one(`select fee_micros from network_fees where ${latest}`, on);
  const litre = (code: string): bigint | undefined =>
    one(
      `select cost_per_litre_cents from product_costs join products on products.id = product_id
        where code = ? and ${latest}`,
      code,
      on,
    );
  const piece = (kind: string): bigint | undefined =>
    one(`select unit_cost_cents from consumable_costs where kind = ? and ${latest}`, kind, on);
  const norm = driver
    .prepare(
      `select products.code, ml from norms join packages on packages.id = package_id
        join products on products.id = product_id where packages.code = ? and body_type = ?`,
    )
    .all(job.package, job.vehicle.bodyType) as { code: string; ml: number }[];

  const labour = (stages: StageMinutes): (bigint | undefined)[] =>
    Object.values(stages).map((minutes) => hourly && halfUp(BigInt(minutes) * hourly, 60n));
  const poured = (code: string, ml: number): bigint | undefined => {
    const cost = litre(code);
    return cost === undefined ? undefined : halfUp(BigInt(ml) * cost, 1000n);
  };
  const feeOf = (revenue: bigint): bigint | undefined =>
    fee === undefined ? undefined : halfUp(revenue * fee, 1_000_000n);
  // Labour of no minute still needs to know its cost (rule 11).
  const known = [hourly, fee].map((cost) => (cost === undefined ? undefined : 0n));

  const revenue = BigInt(job.invoice?.totalCents ?? 0);
  const margin = less(revenue, [
    ...known,
    ...labour(job.actual.stages),
    ...(job.products ?? []).map(({ product, ml }) => poured(product, ml)),
    ...(job.consumables ?? []).map(({ kind, quantity, unitCostCents }) => {
      const cost = unitCostCents === undefined ? piece(kind) : BigInt(unitCostCents);
      return cost === undefined ? undefined : BigInt(quantity) * cost;
    }),
    BigInt(job.boughtInCents ?? 0),
    feeOf(revenue),
  ]);
  if (!job.estimate || norm.length === 0) return { margin, expectedMargin: undefined };
  const price = BigInt(job.estimate.priceCents);
  const expectedMargin = less(price, [
    ...known,
    ...labour(job.estimate.stages),
    ...norm.map(({ code, ml }) => poured(code, ml)),
    feeOf(price),
  ]);
  return { margin, expectedMargin };
}

function less(amount: bigint, costs: (bigint | undefined)[]): bigint | undefined {
  let left = amount;
  for (const cost of costs) {
    if (cost === undefined) return undefined;
    left -= cost;
  }
  return left;
}
