import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  cents,
  centsSum,
  code,
  date,
  HEAD_OFFICE,
  noParams,
  noQuery,
  pageQuery,
  share,
} from './fields';
import { halfYear, warrantyAnswer } from './warranty';

const topic = 'Warranty report';
const common = { topic, access: HEAD_OFFICE, scope: 'network-reference' } as const;

/** One branch and completion half-year of the warranty-risk report (rule 51). */
export const warrantyRiskRow = z.strictObject({
  branch: code,
  cohort: halfYear,
  carsCovered: z.int(),
  carYearsRun: z.number(),
  carYearsLeft: z.number(),
  claims: z.int(),
  paidCents: centsSum,
  per1000: share,
  lower: share,
  upper: share,
  expected: z.number(),
  ratio: share,
  /** Null for a half-year that was not over on the evaluation day: nothing of it has been paid by then (rule 18). */
  outstandingCents: centsSum.nullable(),
  standardErrorCents: centsSum.nullable(),
  /** Counted claims that were not decided on the report's day. */
  claimsOpen: z.int(),
});
export type WarrantyRiskRow = z.output<typeof warrantyRiskRow>;

/** Everything the report says: the whole network from the first job, as of a day. Names as they stood when it was made. */
export const warrantyReport = z.strictObject({
  network: z.string(),
  currency: z.string(),
  asOf: date,
  branches: z.array(z.strictObject({ code, name: z.string(), region: z.string() })),
  answer: warrantyAnswer,
  rows: z.array(warrantyRiskRow),
});
export type WarrantyReport = z.output<typeof warrantyReport>;

const asOfQuery = z.strictObject({ asOf: date.optional() });

export const getWarrantyReport = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-report',
  summary: 'The warranty-risk report of the whole network as of any past day; nothing is stored.',
  params: noParams,
  query: asOfQuery,
  body: null,
  out: warrantyReport,
  statuses: [200],
});

export const getWarrantyReportPdf = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-report/pdf',
  summary: 'The same as a PDF. The same day and data give the same bytes.',
  params: noParams,
  query: asOfQuery,
  body: null,
  out: 'pdf',
  statuses: [200],
});

/** A report as issued: kept unchanged. */
export const issuedReport = z.strictObject({
  id: z.int(),
  asOf: date,
  issuedAt: z.string(),
  /** A person's name, or `schedule`. */
  by: z.string(),
  outstandingCents: centsSum,
  standardErrorCents: centsSum.nullable(),
  covered: z.int(),
  claims: z.int(),
  pdfBytes: z.int(),
  /** Of the stored bytes, so that a copy can be compared with them. */
  pdfSha256: z.string(),
  csvSha256: z.string(),
});
export type IssuedReport = z.output<typeof issuedReport>;

export const issueWarrantyReport = defineEndpoint({
  ...common,
  method: 'post',
  path: '/api/warranty-reports',
  summary: 'Issue the report as of a day (today by default): made, numbered and stored unchanged.',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ asOf: date.optional() }),
  out: issuedReport,
  statuses: [201],
});

export const listWarrantyReports = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-reports',
  summary: 'Issued reports, the newest first.',
  params: noParams,
  query: z.strictObject(pageQuery),
  body: null,
  out: z.strictObject({ items: z.array(issuedReport), nextCursor: z.string().nullable() }),
  statuses: [200],
});

/** Something received after a report was issued that belongs to its period. */
export const laterArrival = z.strictObject({
  kind: z.enum(['job', 'claim']),
  branch: code,
  /** Reference of the job or the claim. */
  ref: z.string(),
  /** The job it is about. */
  jobRef: z.string(),
  what: z.enum(['new', 'corrected', 'voided', 'restored']),
  /** Completion of a job, making of a claim. */
  on: date,
  at: z.string(),
  by: z.string(),
  /** What a claim costs now; null of a job. */
  costCents: cents.nullable(),
});
export type LaterArrival = z.output<typeof laterArrival>;

const reportParams = z.strictObject({ id: z.string() });

export const getIssuedReport = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-reports/:id',
  summary:
    'An issued report as it was, beside it what arrived later for its period and what the same day would say now.',
  params: reportParams,
  query: noQuery,
  body: null,
  out: z.strictObject({
    issued: issuedReport,
    report: warrantyReport,
    /** The first 200 of what arrived later, the last received first. */
    later: z.array(laterArrival),
    laterCount: z.int(),
    /** The same day computed anew from what is stored now. */
    now: z.strictObject({
      covered: z.int(),
      claims: z.int(),
      outstandingCents: centsSum,
      standardErrorCents: centsSum.nullable(),
    }),
  }),
  statuses: [200],
});

export const getIssuedReportPdf = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-reports/:id/pdf',
  summary: 'The stored PDF of an issued report.',
  params: reportParams,
  query: noQuery,
  body: null,
  out: 'pdf',
  statuses: [200],
});

export const getIssuedReportCsv = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-reports/:id/csv',
  summary: 'The stored rows of an issued report as CSV.',
  params: reportParams,
  query: noQuery,
  body: null,
  out: 'csv',
  statuses: [200],
});

/** When the report is issued by itself and who is told. */
const scheduleChoice = z.strictObject({
  active: z.boolean(),
  /** Of every month; the report is as of the last day of the month before. */
  dayOfMonth: z.int().min(1, 'a day from 1 to 28').max(28, 'a day from 1 to 28'),
  /** People of head office, by id. */
  people: z.array(z.int()).max(200),
});

export const warrantySchedule = scheduleChoice.extend({
  /** When it is due next, or null while it is not active. */
  nextOn: date.nullable(),
  lastRun: z
    .strictObject({ month: z.string(), at: z.string(), report: z.int(), mails: z.int() })
    .nullable(),
  /** The mails of the last run and how each stands. */
  mails: z.array(
    z.strictObject({
      to: z.string(),
      state: z.enum(['waiting', 'sent', 'given_up', 'kept_here']),
      attempts: z.int(),
      sentAt: z.string().nullable(),
      lastError: z.string().nullable(),
    }),
  ),
  changedAt: z.string().nullable(),
  changedBy: z.string().nullable(),
});
export type WarrantySchedule = z.output<typeof warrantySchedule>;

export const getWarrantySchedule = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/warranty-schedule',
  summary: 'When the report is issued and mailed by itself.',
  params: noParams,
  query: noQuery,
  body: null,
  out: warrantySchedule,
  statuses: [200],
});

export const putWarrantySchedule = defineEndpoint({
  ...common,
  method: 'put',
  path: '/api/warranty-schedule',
  summary: 'Set when the report is issued and mailed; people must be of head office and active.',
  params: noParams,
  query: noQuery,
  body: scheduleChoice,
  out: warrantySchedule,
  statuses: [200],
});
