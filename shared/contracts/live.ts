import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { code, EVERYONE, noParams, noQuery } from './fields';

/** What reaches an open page: that something changed and where, never the figures themselves. */
export const liveEvent = z.strictObject({
  /** `jobs`: sent, corrected, voided or restored; `claims`; `signals`: opened, acknowledged or over (not to recorders). */
  kind: z.enum(['jobs', 'claims', 'signals']),
  branch: code,
  /** How many changes. */
  count: z.int(),
  /** How many of them are new, not changes of what was there. */
  added: z.int(),
  /** There when the person who hears it did it, here or on another device: it changes the page and is no news. */
  own: z.literal(true).optional(),
});
export type LiveEvent = z.output<typeof liveEvent>;

/**
 * As server-sent events: `event: hello` at the start, `event: change` with a `liveEvent` each, a comment every 20 s. The stream
 * ends with its access token and with the sign-in. Nothing is sent again: whoever comes back reads anew what they show.
 */
export const followLive = defineEndpoint({
  method: 'get',
  path: '/api/live',
  topic: 'Live',
  summary: 'Changes in scope as they happen, as server-sent events.',
  access: EVERYONE,
  scope: 'branches',
  params: noParams,
  query: noQuery,
  body: null,
  out: 'events',
  statuses: [200],
});
