import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { HEAD_OFFICE, noParams, noQuery } from './fields';

export const getHealth = defineEndpoint({
  method: 'get',
  path: '/api/health',
  topic: 'System',
  summary: 'Whether the service and its database answer.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ status: z.literal('ok'), version: z.string(), database: z.literal('ok') }),
  statuses: [200],
});

export const keptMail = z.strictObject({
  id: z.int(),
  to: z.string(),
  subject: z.string(),
  createdAt: z.string(),
  text: z.string(),
});

/** Mail kept locally because no SMTP server is configured; 404 when one is. */
export const listMailbox = defineEndpoint({
  method: 'get',
  path: '/api/mailbox',
  topic: 'System',
  summary: 'Mails kept here instead of being sent (only without SMTP_URL).',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(keptMail) }),
  statuses: [200],
});
