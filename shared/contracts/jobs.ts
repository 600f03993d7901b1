import * as z from 'zod';
import { comeBack } from './come-back';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  branchParams,
  cents,
  centsSum,
  code,
  date,
  line,
  MANAGERS,
  EVERYONE,
  millilitres,
  minutes,
  month,
  noQuery,
  packageCode,
  prose,
  reference,
  SENDERS,
  share,
} from './fields';
import {
  ACTIONS,
  CHECK_ANSWERS,
  CHECKS,
  CONDITIONS,
  CONSUMABLE_KINDS,
  SIDES,
  SOURCES,
  STAGES,
  ZONES,
} from '#shared/domain/vocabulary';

export const stageMinutes = z.strictObject(
  Object.fromEntries(STAGES.map((stage) => [stage, minutes.optional()])) as Record<
    (typeof STAGES)[number],
    z.ZodOptional<typeof minutes>
  >,
);

const vehicle = z.strictObject({
  key: line(64).optional(),
  make: line(60).refine((text) => text.trim().length > 0, 'must not be empty'),
  model: line(60).refine((text) => text.trim().length > 0, 'must not be empty'),
  bodyType,
  firstRegistered: month,
  odometerKm: z.int().min(0).max(9_999_999).optional(),
});

const finding = z.strictObject({
  ref: reference.optional(),
  zone: z.enum(ZONES),
  side: z.enum(SIDES),
  seenAs: z.enum(CONDITIONS),
  workedAs: z.enum(CONDITIONS).optional(),
  structural: z.boolean(),
  action: z.enum(ACTIONS),
  repairMinutes: minutes.optional(),
  chargedCents: cents.optional(),
  note: prose.optional(),
});

export const consumable = z.strictObject({
  kind: z.enum(CONSUMABLE_KINDS),
  quantity: z.int().min(0).max(100_000),
  unitCostCents: cents.optional(),
});

export const checks = z.strictObject(
  Object.fromEntries(CHECKS.map((check) => [check, z.enum(CHECK_ANSWERS).optional()])) as Record<
    (typeof CHECKS)[number],
    z.ZodOptional<z.ZodEnum<{ yes: 'yes'; no: 'no'; na: 'na' }>>
  >,
);

const invoice = z.strictObject({
  number: line(64).optional(),
  issuedOn: date.optional(),
  /** Absent only from a recorder, whose stored total is kept (rule 24). */
  totalCents: cents.optional(),
});

/** What the owner agreed to beyond the quote, on the day it was agreed (rule 76). */
export const extra = z.strictObject({
  on: date,
  minutes: minutes.default(0),
  priceCents: cents.optional(),
  note: prose.optional(),
});

export const workshop = z.strictObject({
  temperatureC: z.number().min(-40).max(60).optional(),
  humidityPct: z.number().min(0).max(100).optional(),
});

/** A completed job as a branch sends it. References to other rows and the order of dates are checked apart, so that all problems come at once. */
export const jobContent = z.strictObject({
  vehicle,
  package: packageCode,
  bookedOn: date.optional(),
  startedOn: date.optional(),
  completedOn: date,
  estimate: z.strictObject({ priceCents: cents, stages: stageMinutes }).optional(),
  agreedExtras: z.array(extra).max(100).optional(),
  actual: z.strictObject({ stages: stageMinutes }),
  products: z
    .array(z.strictObject({ product: code, ml: millilitres }))
    .max(100)
    .optional(),
  consumables: z.array(consumable).max(100).optional(),
  boughtInCents: cents.optional(),
  findings: z.array(finding).max(200).optional(),
  checks: checks.optional(),
  workshop: workshop.optional(),
  /** Absent: the stored invoice stays. `null`: it is removed (rule 73). */
  invoice: invoice.nullable().optional(),
  notes: prose.optional(),
});
export type JobContent = z.output<typeof jobContent>;

export const jobParams = z.strictObject({ branch: z.string(), jobRef: reference });

const stored = {
  jobRef: z.string(),
  revision: z.int(),
  status: z.enum(['created', 'unchanged', 'replaced']),
  voided: z.boolean().optional(),
};
export const putJobAnswer = z.strictObject(stored);

export const putJob = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/jobs/:jobRef',
  topic: 'Jobs',
  summary: 'Send a completed job, or correct one. The reference is the idempotency key.',
  access: SENDERS,
  scope: 'branches',
  params: jobParams,
  /** `via=form`: typed into the product's own form, which is kept as the source of the revision (rule 85). */
  query: z.strictObject({ via: z.enum(['form']).optional() }),
  body: jobContent,
  out: putJobAnswer,
  statuses: [201, 200],
});

const fieldProblem = z.strictObject({ path: z.string(), message: z.string() });

/** A batch is checked item by item, so its items are open here; each is held to `jobContent` with its `jobRef`. */
export const putJobBatch = defineEndpoint({
  method: 'post',
  path: '/api/branches/:branch/jobs/batch',
  topic: 'Jobs',
  summary: 'Send 1 to 1000 jobs. Good ones are kept, bad ones are named.',
  access: SENDERS,
  scope: 'branches',
  params: branchParams,
  query: noQuery,
  body: z.strictObject({ jobs: z.array(z.unknown()).min(1).max(1000) }),
  out: z.strictObject({
    counts: z.strictObject({
      created: z.int(),
      replaced: z.int(),
      unchanged: z.int(),
      rejected: z.int(),
    }),
    results: z.array(
      z.strictObject({
        jobRef: z.string().nullable(),
        status: z.enum(['created', 'unchanged', 'replaced', 'rejected']),
        revision: z.int().optional(),
        voided: z.boolean().optional(),
        problems: z.array(fieldProblem).optional(),
      }),
    ),
  }),
  statuses: [200],
});

/** Money of one job by line, and the bridge from expected to kept. Absent for recorders. */
const jobMoney = z.strictObject({
  revenueCents: centsSum.nullable(),
  labourCents: centsSum,
  productCents: centsSum,
  consumablesCents: centsSum,
  boughtInCents: centsSum,
  feeCents: centsSum,
  costCents: centsSum,
  marginCents: centsSum.nullable(),
  marginShare: share,
  bridge: z
    .strictObject({
      expectedMarginCents: centsSum,
      priceCents: centsSum,
      plannedLabourCents: centsSum,
      rotLabourCents: centsSum,
      productCents: centsSum,
      consumablesCents: centsSum,
      feeCents: centsSum,
      marginCents: centsSum,
    })
    .nullable(),
});

/** One revision of a job: when, how and from whom it came, and what it did. */
export const toldRevision = z.strictObject({
  revision: z.int(),
  receivedAt: z.string(),
  source: z.enum(SOURCES),
  by: z.string(),
  change: z.enum(['created', 'replaced', 'restored']),
});

/** A finding as stored always has its reference. */
const storedFinding = finding.extend({ ref: z.string() });

/** A job as recorded. Money fields but the quoted price are absent for a recorder (rule 24). */
export const jobSheet = jobContent.extend({
  branch: code,
  jobRef: z.string(),
  revision: z.int(),
  receivedAt: z.string(),
  source: z.enum(SOURCES),
  findings: z.array(storedFinding).optional(),
  /** Of every finding that was left on the car, where it stands; without money, so the same for all. */
  comeBacks: z.array(comeBack),
  warrantyMonths: z.int(),
  /** Absent for recorders; `null` where a cost is missing (rule 11). */
  money: jobMoney.nullable().optional(),
  missingCosts: z
    .array(z.strictObject({ kind: z.string(), code: z.string(), on: date }))
    .optional(),
  revisions: z.array(toldRevision),
});
export type JobSheet = z.output<typeof jobSheet>;

export const getJob = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/jobs/:jobRef',
  topic: 'Jobs',
  summary: 'Everything recorded of one job, its margin, bridge and revisions. Carries an ETag.',
  access: EVERYONE,
  scope: 'branches',
  params: jobParams,
  query: noQuery,
  body: null,
  out: jobSheet,
  statuses: [200],
});

export const voidJob = defineEndpoint({
  method: 'delete',
  path: '/api/branches/:branch/jobs/:jobRef',
  topic: 'Jobs',
  summary: 'Void a job: it leaves every figure and stays in the record.',
  access: MANAGERS,
  scope: 'branches',
  params: jobParams,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

/** The bill alone: written from the row of an unbilled car without touching the rest of the job. */
export const billJob = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/jobs/:jobRef/invoice',
  topic: 'Jobs',
  summary:
    'Write the bill of a finished car; makes a new revision that differs in the invoice only.',
  access: MANAGERS,
  scope: 'branches',
  params: jobParams,
  query: noQuery,
  body: z.strictObject({ number: line(64).optional(), issuedOn: date, totalCents: cents }),
  out: putJobAnswer,
  statuses: [200],
});
