import type { Dated, RawCosts, RawJob } from './raw-record';

/** The six steps of a car's bridge, each its effect on margin in cents. */
export const STEPS = [
  'price',
  'plannedLabour',
  'rotLabour',
  'product',
  'consumables',
  'fee',
] as const;
export type Step = (typeof STEPS)[number];

/** A car's money, counted by hand from what its branch sent, in cents. */
export interface CountedCar {
  branch: string;
  jobRef: string;
  completedOn: string;
  billed: boolean;
  revenue: bigint;
  /** What was kept of the bill; of an unbilled car nothing. */
  kept: bigint;
  /** Spent so far, the network's fee apart. */
  spent: bigint;
  /** Of a billed car with an estimate and a norm. */
  bridge: ({ expected: bigint } & Record<Step, bigint>) | undefined;
}

/** x / d rounded half up (rule 1), for whole x ≥ 0. */
const halfUp = (x: bigint, d: bigint): bigint => (2n * x + d) / (2n * d);
const sum = (all: bigint[]): bigint => all.reduce((total, one) => total + one, 0n);

/** Counts a car line by line. Shares no arithmetic with the product; a cost that is missing throws, since the demo has them all. */
export function recountCar({ branch, jobRef, job }: RawJob, costs: RawCosts): CountedCar {
  const cost = (of: Dated, code: string): bigint => {
    const found = of.get(code)?.find(({ from }) => from <= job.completedOn);
    if (!found) throw new Error(`no cost of ${code} on ${job.completedOn}`);
    return found.cost;
  };
  const hourly = cost(costs.hourly, branch);
  const fee = cost(costs.fee, 'network');
  const labour = (stages: Record<string, number>, repair: 'repair' | 'planned'): bigint =>
    sum(
      Object.entries(stages)
        .filter(([stage]) => (stage === 'repair') === (repair === 'repair'))
        .map(([, minutes]) => halfUp(BigInt(minutes) * hourly, 60n)),
    );
  const poured = (lines: { product: string; ml: number }[]): bigint =>
    sum(lines.map(({ product, ml }) => halfUp(BigInt(ml) * cost(costs.litre, product), 1000n)));
  const feeOf = (amount: bigint): bigint => halfUp(amount * fee, 1_000_000n);

  const planned = labour(job.actual.stages, 'planned');
  const rot = labour(job.actual.stages, 'repair');
  const product = poured(job.products ?? []);
  const pieces = sum(
    (job.consumables ?? []).map(
      ({ kind, quantity, unitCostCents }) =>
        BigInt(quantity) *
        (unitCostCents === undefined ? cost(costs.piece, kind) : BigInt(unitCostCents)),
    ),
  );
  const consumables = pieces + BigInt(job.boughtInCents ?? 0);
  const spent = planned + rot + product + consumables;
  const counted = { branch, jobRef, completedOn: job.completedOn, spent };
  if (!job.invoice) return { ...counted, billed: false, revenue: 0n, kept: 0n, bridge: undefined };

  const revenue = BigInt(job.invoice.totalCents);
  const kept = revenue - spent - feeOf(revenue);
  const norm = costs.norms.get(`${job.package} ${job.vehicle.bodyType}`);
  if (!job.estimate || !norm) return { ...counted, billed: true, revenue, kept, bridge: undefined };

  const quoted = BigInt(job.estimate.priceCents);
  const plannedThen = labour(job.estimate.stages, 'planned');
  const rotThen = labour(job.estimate.stages, 'repair');
  const bridge = {
    expected: quoted - plannedThen - rotThen - poured(norm) - feeOf(quoted),
    price: revenue - quoted,
    plannedLabour: plannedThen - planned,
    rotLabour: rotThen - rot,
    product: poured(norm) - product,
    consumables: -consumables,
    fee: feeOf(quoted) - feeOf(revenue),
  };
  return { ...counted, billed: true, revenue, kept, bridge };
}
