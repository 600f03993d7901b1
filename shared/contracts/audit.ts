import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { code, date, HEAD_OFFICE, noParams, noQuery, pageQuery } from './fields';

/** What to look for in the trail; `actor`, `action` and `subject` match from their beginning, case-insensitively, `branch` exactly. */
export const auditQuery = z.strictObject({
  from: date.optional(),
  to: date.optional(),
  actor: z.string().max(320).optional(),
  action: z.string().max(64).optional(),
  subject: z.string().max(300).optional(),
  branch: z.string().max(64).optional(),
  ...pageQuery,
});

export const auditEvent = z.strictObject({
  id: z.int(),
  at: z.string(),
  actor: z.string(),
  /** Network address it came from, or `local`. */
  address: z.string(),
  /** A thing and a verb: `job.void`, `cost.set`. */
  action: z.string(),
  subject: z.string(),
  branch: code.nullable(),
  /** What changed, field by field, where the event tells before and after. */
  changes: z.array(z.strictObject({ path: z.string(), before: z.unknown(), after: z.unknown() })),
  /** Everything else the event tells. */
  detail: z.record(z.string(), z.unknown()),
});
export type AuditEvent = z.output<typeof auditEvent>;

const audit = {
  method: 'get',
  topic: 'Audit trail',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  body: null,
  statuses: [200],
} as const;

export const listAudit = defineEndpoint({
  ...audit,
  path: '/api/audit',
  summary: 'Who did what, when and from where, newest first.',
  query: auditQuery,
  out: z.strictObject({ items: z.array(auditEvent), nextCursor: z.string().nullable() }),
});

export const listAuditNames = defineEndpoint({
  ...audit,
  path: '/api/audit/names',
  summary: 'Who and what occurs in the trail, to choose from.',
  query: noQuery,
  out: z.strictObject({ actors: z.array(z.string()), actions: z.array(z.string()) }),
});

export const checkAudit = defineEndpoint({
  ...audit,
  path: '/api/audit/check',
  summary:
    'Recomputes the chain of the whole trail: how many events, and the first that does not fit.',
  query: noQuery,
  out: z.strictObject({
    events: z.int(),
    /** When the first event was; null in an empty trail. */
    since: z.string().nullable(),
    brokenAt: z.int().nullable(),
    /** Hash of the last event: written down elsewhere, it proves later that nothing before it was changed. */
    lastHash: z.string(),
    checkedAt: z.string(),
  }),
});

export const exportAudit = defineEndpoint({
  ...audit,
  path: '/api/exports/audit.csv',
  topic: 'Exports',
  summary: 'The audit trail, one row an event, with its hash.',
  query: auditQuery.omit({ limit: true, cursor: true }),
  out: 'csv',
});
