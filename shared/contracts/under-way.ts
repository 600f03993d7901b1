import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  branchParams,
  cents,
  code,
  date,
  line,
  millilitres,
  minutes,
  month,
  noQuery,
  packageCode,
  prose,
  reference,
  SENDERS,
} from './fields';
import { checks, consumable, extra, stageMinutes, workshop } from './jobs';
import { ACTIONS, CONDITIONS, SIDES, STAGES, ZONES } from '#shared/domain/vocabulary';

/** People who send jobs; a push key sends finished ones only. */
const PEOPLE_WHO_SEND = { ...SENDERS, pushKey: false } as const;

const timers = z.strictObject(
  Object.fromEntries(
    STAGES.map((stage) => [stage, z.strictObject({ startedAt: z.iso.datetime() }).optional()]),
  ) as Record<
    (typeof STAGES)[number],
    z.ZodOptional<z.ZodObject<{ startedAt: z.ZodISODateTime }, z.core.$strict>>
  >,
);

/** A job as far as it has been written down: the fields of a job, every one of them still open, and the timers running. */
export const jobDraft = z.strictObject({
  vehicle: z
    .strictObject({
      key: line(64),
      make: line(60),
      model: line(60),
      bodyType,
      firstRegistered: month,
      odometerKm: z.int().min(0).max(9_999_999),
    })
    .partial()
    .optional(),
  package: packageCode.optional(),
  bookedOn: date.optional(),
  startedOn: date.optional(),
  completedOn: date.optional(),
  estimate: z.strictObject({ priceCents: cents, stages: stageMinutes }).partial().optional(),
  agreedExtras: z.array(extra).max(100).optional(),
  actual: z.strictObject({ stages: stageMinutes }).optional(),
  products: z
    .array(z.strictObject({ product: code, ml: millilitres.optional() }))
    .max(100)
    .optional(),
  consumables: z.array(consumable).max(100).optional(),
  boughtInCents: cents.optional(),
  findings: z
    .array(
      z.strictObject({
        /** Given when the finding is set, so that its photos belong to it from the start. */
        ref: reference,
        zone: z.enum(ZONES).optional(),
        side: z.enum(SIDES).optional(),
        seenAs: z.enum(CONDITIONS).optional(),
        workedAs: z.enum(CONDITIONS).optional(),
        structural: z.boolean().optional(),
        action: z.enum(ACTIONS).optional(),
        repairMinutes: minutes.optional(),
        chargedCents: cents.optional(),
        note: prose.optional(),
      }),
    )
    .max(200)
    .optional(),
  checks: checks.optional(),
  workshop: workshop.optional(),
  invoice: z
    .strictObject({ number: line(64), issuedOn: date, totalCents: cents })
    .partial()
    .optional(),
  notes: prose.optional(),
  /** When each running timer was started; a stopped one has gone into the minutes. */
  timers: timers.optional(),
});
export type JobDraft = z.output<typeof jobDraft>;

/** A job under way as kept for the colleagues of the branch. Money but the quoted price is absent for a recorder. */
export const jobUnderWay = z.strictObject({
  branch: code,
  jobRef: z.string(),
  /** Counts the times it was kept; the ETag. */
  revision: z.int(),
  content: jobDraft,
  startedBy: z.string(),
  startedAt: z.string(),
  changedBy: z.string(),
  changedAt: z.string(),
  photos: z.int(),
});
export type JobUnderWay = z.output<typeof jobUnderWay>;

const params = z.strictObject({ branch: z.string(), jobRef: reference });
const underWay = {
  topic: 'Jobs under way',
  access: PEOPLE_WHO_SEND,
  scope: 'branches',
  query: noQuery,
} as const;

export const listUnderWay = defineEndpoint({
  ...underWay,
  method: 'get',
  path: '/api/branches/:branch/under-way',
  summary: 'Jobs of the branch that are under way, the last changed first.',
  params: branchParams,
  body: null,
  out: z.strictObject({ items: z.array(jobUnderWay) }),
  statuses: [200],
});

export const getUnderWay = defineEndpoint({
  ...underWay,
  method: 'get',
  path: '/api/branches/:branch/under-way/:jobRef',
  summary: 'One job under way. Carries an ETag.',
  params,
  body: null,
  out: jobUnderWay,
  statuses: [200],
});

/** Honours If-Match and If-None-Match like a job (rule 73). Refused with 409 once a job of this reference is accepted. */
export const keepUnderWay = defineEndpoint({
  ...underWay,
  method: 'put',
  path: '/api/branches/:branch/under-way/:jobRef',
  summary:
    'Keep a job under way, to go on with it on another device or have a colleague go on. Ends when the job is sent.',
  params,
  body: jobDraft,
  out: jobUnderWay,
  statuses: [201, 200],
});

export const dropUnderWay = defineEndpoint({
  ...underWay,
  method: 'delete',
  path: '/api/branches/:branch/under-way/:jobRef',
  summary: 'Drop a job under way, with the photos sent for it.',
  params,
  body: null,
  out: 'nothing',
  statuses: [204],
});
