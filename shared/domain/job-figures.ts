import { ageBand, ageInYears, isoWeek } from './calendar';
import type { CostBook } from './cost-book';
import { consumableCents, feeCents, labourCents, productCents } from './money';
import { isRot, type RecordedJob, type StageMinutes } from './recorded-job';
import { rotPlaces } from './rot-places';
import { STAGES, type AgeBand, type Stage } from './vocabulary';

/** A cost that was not known on a job's day (rule 11). */
export interface MissingCost {
  kind: 'hourlyCost' | 'product' | 'consumable' | 'fee';
  code: string;
  on: string;
}

/** What a job cost, line by line, in cents; each line rounded half up before it is added (rule 1). */
export interface ActualMoney {
  revenueCents: number;
  /** Every stage but repair. */
  labourCents: number;
  repairLabourCents: number;
  productCents: number;
  consumablesCents: number;
  boughtInCents: number;
  feeCents: number;
}

/** The same from the estimate: quoted price, estimated minutes, norm product, fee on the quoted price. */
export interface ExpectedMoney {
  priceCents: number;
  labourCents: number;
  repairLabourCents: number;
  productCents: number;
  feeCents: number;
}

/** Everything that is derived from a recorded job. */
export interface JobFigures {
  week: string;
  month: string;
  ageBand: AgeBand;
  hasRot: boolean;
  /** Zones and sides with rot as one number (`rot-places`). */
  rotPlaces: number;
  /** Findings seen as bubbling and then worked, and of them those worked as holed (rule 46). */
  bubblesWorked: number;
  bubblesHoled: number;
  billed: boolean;
  /** An estimate of more than 0 minutes (rule 12). */
  hasEstimate: boolean;
  estimated: Record<Stage, number>;
  actual: Record<Stage, number>;
  estimatedMinutes: number;
  actualMinutes: number;
  /** Repair minutes of findings that were charged beyond the quote (rule 50). */
  chargedRepairMinutes: number;
  extraMinutes: number;
  extraCents: number;
  /** Millilitres and rounded cost by product; cost null where none was known. */
  products: Map<string, { ml: number; costCents: number | null }>;
  /** Millilitres that the norm foresees, 0 without one, and those used of its products (rule 39). */
  normMl: number;
  normedMl: number;
  boughtInCents: number;
  /** Undefined when any cost of the job's own was missing. */
  money: ActualMoney | undefined;
  /** Undefined without an estimate, a norm, or a cost that either needs. */
  expected: ExpectedMoney | undefined;
  missing: MissingCost[];
}

/** Computes all derived figures of a job of a branch from the costs valid on its completion day. The only place that does. */
export function deriveFigures(job: RecordedJob, branch: string, costs: CostBook): JobFigures {
  const on = job.completedOn;
  const missing = new MissingCosts(on);
  const estimated = everyStage(job.estimate?.stages ?? {});
  const actual = everyStage(job.actual.stages);
  const estimatedMinutes = total(estimated);
  const hourly = missing.noted('hourlyCost', branch, costs.hourlyCost(branch, on));
  const fee = missing.noted('fee', 'network', costs.feeMicros(on));
  const products = productLines(job, costs, missing);
  const consumables = consumableLines(job, costs, missing);
  const complete = missing.list.length === 0;
  const norm = costs.norm(job.package, job.vehicle.bodyType) ?? [];
  const worked = (job.findings ?? []).filter(
    (finding) => finding.seenAs === 'bubbling' && finding.workedAs !== undefined,
  );
  const charged = (job.findings ?? []).filter((finding) => (finding.chargedCents ?? 0) > 0);
  return {
    week: isoWeek(on),
    month: on.slice(0, 7),
    ageBand: ageBand(ageInYears(job.vehicle.firstRegistered, on)),
    hasRot: (job.findings ?? []).some(isRot),
    rotPlaces: rotPlaces(job.findings ?? []),
    bubblesWorked: worked.length,
    bubblesHoled: worked.filter((finding) => finding.workedAs === 'holed').length,
    billed: job.invoice !== undefined,
    hasEstimate: estimatedMinutes > 0,
    estimated,
    actual,
    estimatedMinutes,
    actualMinutes: total(actual),
    chargedRepairMinutes: sum(charged.map((finding) => finding.repairMinutes ?? 0)),
    extraMinutes: sum((job.agreedExtras ?? []).map((extra) => extra.minutes ?? 0)),
    extraCents: sum((job.agreedExtras ?? []).map((extra) => extra.priceCents ?? 0)),
    products,
    normMl: sum(norm.map((line) => line.ml)),
    normedMl: sum(norm.map((line) => products.get(line.product)?.ml ?? 0)),
    boughtInCents: job.boughtInCents ?? 0,
    money:
      complete && hourly !== undefined && fee !== undefined
        ? actualMoney(job, actual, hourly, fee, products, consumables)
        : undefined,
    expected: expectedMoney(job, estimated, costs, hourly, fee, missing),
    missing: missing.list,
  };
}

/** The margin of a billed job in cents: revenue less every cost line. */
export function marginCents(money: ActualMoney): number {
  return money.revenueCents - costCents(money) - money.feeCents;
}

/** What a job has cost before the network fee, in cents. */
export function costCents(money: ActualMoney): number {
  return (
    money.labourCents +
    money.repairLabourCents +
    money.productCents +
    money.consumablesCents +
    money.boughtInCents
  );
}

/** The margin that the estimate promised, in cents. */
export function expectedMarginCents(expected: ExpectedMoney): number {
  return (
    expected.priceCents -
    expected.labourCents -
    expected.repairLabourCents -
    expected.productCents -
    expected.feeCents
  );
}

/** Collects what is missing, each kind and code once. */
class MissingCosts {
  readonly list: MissingCost[] = [];

  constructor(private readonly on: string) {}

  noted(kind: MissingCost['kind'], code: string, value: number | undefined): number | undefined {
    const known = this.list.some((entry) => entry.kind === kind && entry.code === code);
    if (value === undefined && !known) this.list.push({ kind, code, on: this.on });
    return value;
  }
}

function productLines(
  job: RecordedJob,
  costs: CostBook,
  missing: MissingCosts,
): JobFigures['products'] {
  const lines: JobFigures['products'] = new Map();
  for (const { product, ml } of job.products ?? []) {
    const cost = missing.noted('product', product, costs.productCost(product, job.completedOn));
    const line = cost === undefined ? null : productCents(ml, cost);
    const before = lines.get(product) ?? { ml: 0, costCents: 0 };
    lines.set(product, {
      ml: before.ml + ml,
      costCents: line === null || before.costCents === null ? null : before.costCents + line,
    });
  }
  return lines;
}

function consumableLines(job: RecordedJob, costs: CostBook, missing: MissingCosts): number {
  let cents = 0;
  for (const { kind, quantity, unitCostCents } of job.consumables ?? []) {
    const cost =
      unitCostCents ??
      missing.noted('consumable', kind, costs.consumableCost(kind, job.completedOn));
    cents += consumableCents(quantity, cost ?? 0);
  }
  return cents;
}

function actualMoney(
  job: RecordedJob,
  actual: Record<Stage, number>,
  hourly: number,
  fee: number,
  products: JobFigures['products'],
  consumables: number,
): ActualMoney {
  const revenueCents = job.invoice?.totalCents ?? 0;
  return {
    revenueCents,
    ...labour(actual, hourly),
    productCents: sum([...products.values()].map((line) => line.costCents ?? 0)),
    consumablesCents: consumables,
    boughtInCents: job.boughtInCents ?? 0,
    feeCents: feeCents(revenueCents, fee),
  };
}

function expectedMoney(
  job: RecordedJob,
  estimated: Record<Stage, number>,
  costs: CostBook,
  hourly: number | undefined,
  fee: number | undefined,
  missing: MissingCosts,
): ExpectedMoney | undefined {
  const norm = costs.norm(job.package, job.vehicle.bodyType);
  if (!job.estimate || !norm) return undefined;
  let product: number | undefined = 0;
  for (const line of norm) {
    const cost = missing.noted(
      'product',
      line.product,
      costs.productCost(line.product, job.completedOn),
    );
    product =
      cost === undefined || product === undefined
        ? undefined
        : product + productCents(line.ml, cost);
  }
  if (product === undefined || hourly === undefined || fee === undefined) return undefined;
  return {
    priceCents: job.estimate.priceCents,
    ...labour(estimated, hourly),
    productCents: product,
    feeCents: feeCents(job.estimate.priceCents, fee),
  };
}

/** Every stage that is in an estimate as a matter of course. */
const PLANNED = STAGES.filter((stage) => stage !== 'repair');

function labour(
  stages: Record<Stage, number>,
  hourly: number,
): { labourCents: number; repairLabourCents: number } {
  let planned = 0;
  for (const stage of PLANNED) planned += labourCents(stages[stage], hourly);
  return { labourCents: planned, repairLabourCents: labourCents(stages.repair, hourly) };
}

function everyStage(stages: StageMinutes): Record<Stage, number> {
  return {
    strip: stages.strip ?? 0,
    clean: stages.clean ?? 0,
    dry: stages.dry ?? 0,
    repair: stages.repair ?? 0,
    mask: stages.mask ?? 0,
    apply: stages.apply ?? 0,
    refit: stages.refit ?? 0,
  };
}

function total(stages: Record<Stage, number>): number {
  let minutes = 0;
  for (const stage of STAGES) minutes += stages[stage];
  return minutes;
}

function sum(values: number[]): number {
  return values.reduce((all, value) => all + value, 0);
}
