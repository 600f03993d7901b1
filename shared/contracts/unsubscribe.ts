import * as z from 'zod';
import { MAIL_KINDS } from '#shared/domain/mail-kinds';
import { defineEndpoint } from './endpoint';
import { noParams } from './fields';

const query = z.strictObject({ token: z.string().max(2000) });
/** Which mail the link is about, and whether it still comes. The name and address of its receiver are not told. */
export const unsubscription = z.strictObject({ kind: z.enum(MAIL_KINDS), wanted: z.boolean() });
export type Unsubscription = z.output<typeof unsubscription>;

const common = {
  path: '/api/mail/unsubscribe',
  topic: 'Mail',
  access: 'public',
  scope: 'none',
  params: noParams,
  query,
  body: null,
  out: unsubscription,
  statuses: [200],
} as const;

export const readUnsubscription = defineEndpoint({
  ...common,
  method: 'get',
  summary: 'Which mail a signed link stops; changes nothing (mail scanners open links).',
});

/** One click in the mail program posts here with a form as its body, which is not read (RFC 8058). */
export const unsubscribe = defineEndpoint({
  ...common,
  method: 'post',
  summary: 'Stop the mail of a signed link; asked twice, the same answer.',
});
