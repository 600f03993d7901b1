import * as z from 'zod';
import { AGE_BANDS, CLAIM_CAUSES, CLAIM_DECISIONS, SIDES, ZONES } from '#shared/domain/vocabulary';
import { claimParams } from './claims';
import { fieldChange } from './corrections';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  centsSum,
  code,
  date,
  EVERYONE,
  flag,
  month,
  noParams,
  noQuery,
  packageCode,
  pageQuery,
  scopeQuery,
} from './fields';
import { toldRevision } from './jobs';
import { halfYear } from './warranty';

const topic = 'Claims';
export const CLAIM_SORTS = ['made', 'cost', 'completed'] as const;

/** One row of a list of claims. Money is absent for recorders. */
export const claimRow = z.strictObject({
  branch: code,
  claimRef: z.string(),
  revision: z.int(),
  jobRef: z.string(),
  vehicle: z.strictObject({
    make: z.string(),
    model: z.string(),
    bodyType,
    firstRegistered: month,
  }),
  package: packageCode,
  completedOn: date,
  madeOn: date,
  /** Month since completion in which it was made (rule 17). */
  month: z.int(),
  /** Made on or before the warranty's end. */
  inWarranty: z.boolean(),
  /** Whether it counts at asOf (rule 14). */
  counted: z.boolean(),
  zone: z.enum(ZONES),
  side: z.enum(SIDES).nullable(),
  cause: z.enum(CLAIM_CAUSES),
  /** The decision that counts. */
  decision: z.enum(CLAIM_DECISIONS),
  /** One above the claim limit that waits for head office (rule 77). */
  proposedDecision: z.enum(CLAIM_DECISIONS).nullable(),
  decidedOn: date.nullable(),
  paidOn: date.nullable(),
  labourMinutes: z.int(),
  productMl: z.int(),
  costCents: centsSum.optional(),
});
export type ClaimRow = z.output<typeof claimRow>;

export const claimsQuery = scopeQuery.extend({
  /** Cut of rule 14; today by default. */
  asOf: date.optional(),
  /** Only claims that count at asOf, or only those that do not. */
  counted: flag.optional(),
  decision: z.enum(CLAIM_DECISIONS).optional(),
  /** Claims that wait for head office. */
  waiting: flag.optional(),
  cause: z.enum(CLAIM_CAUSES).optional(),
  zone: z.enum(ZONES).optional(),
  ageBand: z.enum(AGE_BANDS).optional(),
  /** Half-year of completion. */
  cohort: halfYear.optional(),
  /** With one branch: the claims on one job. */
  jobRef: z.string().max(64).optional(),
  /** In the claim's or the job's reference, make or model. */
  q: z.string().max(100).optional(),
  sort: z.enum(CLAIM_SORTS).default('made'),
  ...pageQuery,
});

export const listClaims = defineEndpoint({
  method: 'get',
  path: '/api/claims',
  topic,
  summary:
    'Claims in scope, the last made first unless sorted otherwise; from/to choose jobs by completion. No default period.',
  access: EVERYONE,
  scope: 'branches',
  params: noParams,
  query: claimsQuery,
  body: null,
  out: z.strictObject({
    items: z.array(claimRow),
    nextCursor: z.string().nullable(),
    /** All that match, not only this page. */
    claims: z.int(),
    /** Absent for recorders. */
    costCents: centsSum.optional(),
  }),
  statuses: [200],
});

export const getClaimHistory = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/claims/:claimRef/history',
  topic,
  summary:
    'Every revision of a claim, the newest first: who, when, by which way, and what changed.',
  access: EVERYONE,
  scope: 'branches',
  params: claimParams,
  query: noQuery,
  body: null,
  out: z.strictObject({
    items: z.array(
      toldRevision.extend({
        /** Against the revision before; of the first, everything was new and nothing is listed. */
        changes: z.array(fieldChange),
      }),
    ),
  }),
  statuses: [200],
});
