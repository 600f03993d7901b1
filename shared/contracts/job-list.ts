import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  centsSum,
  code,
  date,
  EVERYONE,
  flag,
  month,
  packageCode,
  pageQuery,
  scopeQuery,
  share,
} from './fields';
import { AGE_BANDS, SIDES, ZONES } from '#shared/domain/vocabulary';

export const PRODUCT_USES = ['under', 'over'] as const;
export const JOB_SORTS = ['completed', 'margin', 'difference', 'overrun', 'waiting'] as const;

/** One row of a list of jobs (rule 84). Money is absent for recorders. */
export const jobRow = z.strictObject({
  branch: code,
  jobRef: z.string(),
  revision: z.int(),
  vehicle: z.strictObject({
    key: z.string().optional(),
    make: z.string(),
    model: z.string(),
    bodyType,
    firstRegistered: month,
  }),
  package: packageCode,
  completedOn: date,
  hasRot: z.boolean(),
  unbilled: z.boolean(),
  /** Days since completion of an unbilled job, else null. */
  daysWaiting: z.int().nullable(),
  estimatedMinutes: z.int().nullable(),
  actualMinutes: z.int(),
  /** Actual minus estimated minutes; null without an estimate. */
  overrunMinutes: z.int().nullable(),
  /** Rule 50; null for a billed job or one without an estimate. */
  beyondChargedMinutes: z.int().nullable(),
  agreedExtraMinutes: z.int(),
  agreedExtraCents: centsSum.optional(),
  revenueCents: centsSum.nullable().optional(),
  costCents: centsSum.nullable().optional(),
  marginCents: centsSum.nullable().optional(),
  marginShare: share.optional(),
  expectedMarginCents: centsSum.nullable().optional(),
  /** The bridge step with the largest effect either way; null where there is no bridge. */
  largestStep: z
    .strictObject({
      step: z.enum(['price', 'plannedLabour', 'rotLabour', 'product', 'consumables', 'fee']),
      cents: centsSum,
    })
    .nullable()
    .optional(),
});
export type JobRow = z.output<typeof jobRow>;

export const jobsQuery = scopeQuery.extend({
  make: z.string().max(60).optional(),
  model: z.string().max(60).optional(),
  unbilled: flag.optional(),
  hasRot: flag.optional(),
  q: z.string().max(100).optional(),
  /** Lists of one screen: the cars behind a figure. */
  ageBand: z.enum(AGE_BANDS).optional(),
  hasEstimate: flag.optional(),
  /** Cars with rot in this zone; with `side`, on that side of it. */
  zone: z.enum(ZONES).optional(),
  side: z.enum(SIDES).optional(),
  /** Cars on which this product went in; with `use`, those under 70 % or over 130 % of its norm (rule 37). */
  product: z.string().max(64).optional(),
  use: z.enum(PRODUCT_USES).optional(),
  sort: z.enum(JOB_SORTS).default('completed'),
  ...pageQuery,
});

export const listJobs = defineEndpoint({
  method: 'get',
  path: '/api/jobs',
  topic: 'Jobs',
  summary: 'Jobs in scope, newest first unless sorted otherwise. No default period.',
  access: EVERYONE,
  scope: 'branches',
  params: z.strictObject({}),
  query: jobsQuery,
  body: null,
  out: z.strictObject({
    items: z.array(jobRow),
    nextCursor: z.string().nullable(),
    /** All jobs that match, not only this page. */
    jobs: z.int(),
  }),
  statuses: [200],
});
