import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { branchParams, HEAD_OFFICE, name, noQuery } from './fields';

const topic = 'Push keys';

export const pushKey = z.strictObject({
  id: z.string(),
  label: z.string(),
  createdAt: z.string(),
  lastUsedAt: z.string().nullable(),
  revokedAt: z.string().nullable(),
});

export const addKey = defineEndpoint({
  method: 'post',
  path: '/api/branches/:branch/keys',
  topic,
  summary: 'Make a push key for one branch. The key itself is in this answer and nowhere else.',
  access: HEAD_OFFICE,
  scope: 'branches',
  params: branchParams,
  query: noQuery,
  body: z.strictObject({ label: name }),
  out: z.strictObject({ id: z.string(), label: z.string(), key: z.string() }),
  statuses: [201],
});

export const listKeys = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/keys',
  topic,
  summary: 'Push keys of a branch with their last use.',
  access: HEAD_OFFICE,
  scope: 'branches',
  params: branchParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(pushKey) }),
  statuses: [200],
});

export const revokeKey = defineEndpoint({
  method: 'delete',
  path: '/api/branches/:branch/keys/:id',
  topic,
  summary: 'Revoke a push key; it stops working at once.',
  access: HEAD_OFFICE,
  scope: 'branches',
  params: z.strictObject({ branch: z.string(), id: z.string().max(64) }),
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});
