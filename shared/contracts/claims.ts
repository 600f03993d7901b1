import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  branchParams,
  cents,
  code,
  date,
  EVERYONE,
  line,
  millilitres,
  minutes,
  noQuery,
  reference,
  SENDERS,
} from './fields';
import { CLAIM_CAUSES, CLAIM_DECISIONS, SIDES, ZONES } from '#shared/domain/vocabulary';

/** A claim under warranty on an earlier job of the branch. */
export const claimContent = z.strictObject({
  jobRef: reference,
  madeOn: date,
  zone: z.enum(ZONES),
  side: z.enum(SIDES).optional(),
  cause: z.enum(CLAIM_CAUSES),
  decision: z.enum(CLAIM_DECISIONS),
  decidedOn: date.optional(),
  labourMinutes: minutes.default(0),
  productMl: millilitres.default(0),
  /** Money: absent from a recorder's claim, whose stored cost is kept (rule 24). */
  costCents: cents.optional(),
  paidOn: date.optional(),
  note: line(1000).optional(),
});
export type ClaimContent = z.output<typeof claimContent>;

export const claimParams = z.strictObject({ branch: z.string(), claimRef: reference });

export const putClaimAnswer = z.strictObject({
  claimRef: z.string(),
  revision: z.int(),
  status: z.enum(['created', 'unchanged', 'replaced']),
  /** The decision as stored: `open` while one above the claim limit waits for head office (rule 77). */
  decision: z.enum(CLAIM_DECISIONS),
  proposedDecision: z.enum(CLAIM_DECISIONS).optional(),
});

export const putClaim = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/claims/:claimRef',
  topic: 'Claims',
  summary: 'Send a claim, or correct one. The reference is the idempotency key.',
  access: SENDERS,
  scope: 'branches',
  params: claimParams,
  query: noQuery,
  body: claimContent,
  out: putClaimAnswer,
  statuses: [201, 200],
});

export const putClaimBatch = defineEndpoint({
  method: 'post',
  path: '/api/branches/:branch/claims/batch',
  topic: 'Claims',
  summary: 'Send 1 to 1000 claims. Good ones are kept, bad ones are named.',
  access: SENDERS,
  scope: 'branches',
  params: branchParams,
  query: noQuery,
  body: z.strictObject({ claims: z.array(z.unknown()).min(1).max(1000) }),
  out: z.strictObject({
    counts: z.strictObject({
      created: z.int(),
      replaced: z.int(),
      unchanged: z.int(),
      rejected: z.int(),
    }),
    results: z.array(
      z.strictObject({
        claimRef: z.string().nullable(),
        status: z.enum(['created', 'unchanged', 'replaced', 'rejected']),
        revision: z.int().optional(),
        decision: z.enum(CLAIM_DECISIONS).optional(),
        proposedDecision: z.enum(CLAIM_DECISIONS).optional(),
        problems: z.array(z.strictObject({ path: z.string(), message: z.string() })).optional(),
      }),
    ),
  }),
  statuses: [200],
});

export const getClaim = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/claims/:claimRef',
  topic: 'Claims',
  summary: 'One claim as recorded. Absent while its job is voided (rule 59). Carries an ETag.',
  access: EVERYONE,
  scope: 'branches',
  params: claimParams,
  query: noQuery,
  body: null,
  out: claimContent.extend({
    branch: code,
    claimRef: z.string(),
    revision: z.int(),
    proposedDecision: z.enum(CLAIM_DECISIONS).optional(),
  }),
  statuses: [200],
});
