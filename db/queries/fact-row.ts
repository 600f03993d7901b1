import { expectedMarginCents, marginCents, type JobFigures } from '#shared/domain/job-figures';
import { folded, modelKey, type RecordedJob } from '#shared/domain/recorded-job';
import { AGE_BANDS, CHECKS, STAGES } from '#shared/domain/vocabulary';

/** What a flat row says of a job besides what is derived from its content. */
export interface JobIdentity {
  jobId: number;
  branchId: number;
  jobRef: string;
  revision: number;
  packageId: number;
  warrantyMonths: number;
}

/** Columns of job_facts without its id and generations, in the order of `factValues`. */
export const FACT_COLUMNS = [
  ...[
    'job_id',
    'branch_id',
    'job_ref',
    'revision',
    'completed_on',
    'week',
    'month',
    'make',
    'model',
  ],
  ...['model_key', 'search_text', 'vehicle_key', 'first_registered', 'age_band', 'body_type'],
  ...['package_id', 'has_rot', 'billed', 'warranty_months'],
  ...STAGES.map((stage) => `est_${stage}`),
  ...STAGES.map((stage) => `act_${stage}`),
  ...['est_minutes', 'act_minutes', 'has_estimate', 'charged_repair_minutes'],
  ...['extra_minutes', 'extra_cents', 'costed', 'revenue_cents', 'labour_cents'],
  ...[
    'repair_labour_cents',
    'product_cents',
    'consumables_cents',
    'bought_in_cents',
    'fee_cents',
    'margin_cents',
  ],
  ...['expected', 'exp_price_cents', 'exp_labour_cents', 'exp_repair_labour_cents'],
  ...[
    'exp_product_cents',
    'exp_fee_cents',
    'exp_margin_cents',
    'missing_costs',
    'temperature_c',
    'humidity_pct',
  ],
  ...CHECKS.map(
    (check) => `check_${check.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)}`,
  ),
  ...['rot_zones', 'bubbles_worked', 'bubbles_holed', 'norm_ml', 'normed_ml'],
  'bought_in_sent_cents',
];

export type FactValue = string | number | null;

/** The flat row of a job: one value a column. */
export function factValues(id: JobIdentity, job: RecordedJob, figures: JobFigures): FactValue[] {
  const { vehicle } = job;
  const { money, expected } = figures;
  return [
    id.jobId,
    id.branchId,
    id.jobRef,
    id.revision,
    job.completedOn,
    figures.week,
    figures.month,
    vehicle.make,
    vehicle.model,
    modelKey(vehicle.make, vehicle.model),
    folded(`${id.jobRef} ${vehicle.make} ${vehicle.model}`),
    vehicle.key ?? null,
    vehicle.firstRegistered,
    AGE_BANDS.indexOf(figures.ageBand),
    vehicle.bodyType,
    id.packageId,
    bit(figures.hasRot),
    bit(figures.billed),
    id.warrantyMonths,
    ...STAGES.map((stage) => figures.estimated[stage]),
    ...STAGES.map((stage) => figures.actual[stage]),
    figures.estimatedMinutes,
    figures.actualMinutes,
    bit(figures.hasEstimate),
    figures.chargedRepairMinutes,
    figures.extraMinutes,
    figures.extraCents,
    bit(money !== undefined),
    money?.revenueCents ?? 0,
    money?.labourCents ?? 0,
    money?.repairLabourCents ?? 0,
    money?.productCents ?? 0,
    money?.consumablesCents ?? 0,
    money?.boughtInCents ?? 0,
    money?.feeCents ?? 0,
    money ? marginCents(money) : 0,
    bit(money !== undefined && expected !== undefined),
    expected?.priceCents ?? 0,
    expected?.labourCents ?? 0,
    expected?.repairLabourCents ?? 0,
    expected?.productCents ?? 0,
    expected?.feeCents ?? 0,
    expected ? expectedMarginCents(expected) : 0,
    figures.missing.length > 0 ? JSON.stringify(figures.missing) : null,
    job.workshop?.temperatureC ?? null,
    job.workshop?.humidityPct ?? null,
    ...CHECKS.map((check) => job.checks?.[check] ?? null),
    figures.rotPlaces,
    figures.bubblesWorked,
    figures.bubblesHoled,
    figures.normMl,
    figures.normedMl,
    figures.boughtInCents,
  ];
}

function bit(value: boolean): 0 | 1 {
  return value ? 1 : 0;
}
