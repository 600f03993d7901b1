import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  branchParams,
  code,
  date,
  EVERYONE,
  MANAGERS,
  noQuery,
  pageQuery,
  reference,
} from './fields';
import { jobParams, putJobAnswer, toldRevision } from './jobs';

const topic = 'Corrections';

/** What stood in a field before or after; null: nothing. */
const value = z.union([z.string(), z.number(), z.boolean()]).nullable();

/** Findings are matched by their reference, products and consumables by product and kind (the second of one is `CW1:2`), the rest by place. */
export const fieldChange = z.strictObject({
  /** JSON pointer into the job; a list's item by its key: `/findings/sill_inner~1left~11/workedAs`. */
  path: z.string(),
  before: value,
  after: value,
});

export const getJobChanges = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/jobs/:jobRef/changes',
  topic,
  summary:
    'What changed between two revisions of a job, field by field; by default between the last two. Without money for a recorder.',
  access: EVERYONE,
  scope: 'branches',
  params: jobParams,
  query: z.strictObject({
    from: z.coerce.number().int().min(1).optional(),
    to: z.coerce.number().int().min(1).optional(),
  }),
  body: null,
  out: z.strictObject({
    /** Null where there is no earlier revision: everything was new. */
    from: toldRevision.nullable(),
    to: toldRevision,
    changes: z.array(fieldChange),
  }),
  statuses: [200],
});

export const restoreJob = defineEndpoint({
  method: 'post',
  path: '/api/branches/:branch/jobs/:jobRef/restore',
  topic,
  summary:
    'Bring a voided job back as it was: into every figure, with its claims. Not a revision; 404 when the job is not void.',
  access: MANAGERS,
  scope: 'branches',
  params: jobParams,
  query: noQuery,
  body: null,
  out: putJobAnswer.omit({ status: true }),
  statuses: [200],
});

export const voidedJob = z.strictObject({
  branch: code,
  jobRef: reference,
  revision: z.int(),
  make: z.string(),
  model: z.string(),
  firstRegistered: z.string(),
  package: z.string(),
  completedOn: date,
  voidedAt: z.string(),
  /** Absent where the trail does not say. */
  voidedBy: z.string().nullable(),
});

export const listVoidedJobs = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/voided-jobs',
  topic,
  summary: 'Voided jobs of the branch, the last voided first.',
  access: MANAGERS,
  scope: 'branches',
  params: branchParams,
  query: z.strictObject(pageQuery),
  body: null,
  out: z.strictObject({ items: z.array(voidedJob), nextCursor: z.string().nullable() }),
  statuses: [200],
});
