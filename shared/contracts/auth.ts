import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { code, EVERYONE, name, noParams, noQuery, role } from './fields';
import { MAIL_KINDS } from '#shared/domain/mail-kinds';

/** Passwords have at least 12 characters (rule 65); bcrypt reads 72 bytes, so longer ones are refused rather than cut. */
export const password = z
  .string()
  .min(12, 'a password has at least 12 characters')
  .refine((text) => new TextEncoder().encode(text).length <= 72, 'a password has at most 72 bytes');

/** The person signed in, with the codes of what they were given (not of what follows from it). */
export const signedInPerson = z.strictObject({
  id: z.int(),
  email: z.string(),
  name: z.string(),
  role,
  regions: z.array(code),
  branches: z.array(code),
});
export type SignedInPerson = z.output<typeof signedInPerson>;

export const signInAnswer = z.strictObject({
  accessToken: z.string(),
  expiresInSeconds: z.int(),
  person: signedInPerson,
});

export const signIn = defineEndpoint({
  method: 'post',
  path: '/api/auth/sign-in',
  topic: 'Signing in',
  summary: 'Exchange e-mail and password for an access token; sets the refresh cookie.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ email: z.string().max(320), password: z.string().max(1000) }),
  out: signInAnswer,
  statuses: [200],
});

export const refresh = defineEndpoint({
  method: 'post',
  path: '/api/auth/refresh',
  topic: 'Signing in',
  summary: 'Exchange the refresh cookie for a new access token and a new cookie.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: signInAnswer,
  statuses: [200],
});

export const signOut = defineEndpoint({
  method: 'post',
  path: '/api/auth/sign-out',
  topic: 'Signing in',
  summary: 'End this sign-in and clear its cookie. Also answers when there is none.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

export const me = defineEndpoint({
  method: 'get',
  path: '/api/auth/me',
  topic: 'Signing in',
  summary: 'Who is signed in.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: signedInPerson,
  statuses: [200],
});

export const changePassword = defineEndpoint({
  method: 'post',
  path: '/api/auth/password',
  topic: 'Signing in',
  summary: 'Change the own password; every other sign-in of this person ends.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ currentPassword: z.string().max(1000), newPassword: password }),
  out: 'nothing',
  statuses: [204],
});

export const changeName = defineEndpoint({
  method: 'put',
  path: '/api/auth/me',
  topic: 'Signing in',
  summary: 'Change the own name.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ name }),
  out: signedInPerson,
  statuses: [200],
});

export const requestReset = defineEndpoint({
  method: 'post',
  path: '/api/auth/reset-request',
  topic: 'Signing in',
  summary:
    'Ask for a mail with a link to set a new password. Answers alike whether or not the e-mail is known.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ email: z.string().max(320) }),
  out: 'nothing',
  statuses: [204],
});

/** Redeems the token of an invitation or reset mail. */
export const setPassword = defineEndpoint({
  method: 'post',
  path: '/api/auth/set-password',
  topic: 'Signing in',
  summary: 'Set a password with the token of an invitation or reset mail; the token works once.',
  access: 'public',
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ token: z.string().max(200), newPassword: password }),
  out: 'nothing',
  statuses: [204],
});

export const openSignIn = z.strictObject({
  id: z.int(),
  startedAt: z.string(),
  lastUsedAt: z.string(),
  device: z.string(),
  current: z.boolean(),
});

export const listSignIns = defineEndpoint({
  method: 'get',
  path: '/api/auth/sign-ins',
  topic: 'Signing in',
  summary: 'The own open sign-ins.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(openSignIn) }),
  statuses: [200],
});

export const endSignIns = defineEndpoint({
  method: 'delete',
  path: '/api/auth/sign-ins',
  topic: 'Signing in',
  summary: 'Sign out everywhere, here included.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

const mailChoice = z.strictObject({ kind: z.enum(MAIL_KINDS), wanted: z.boolean() });

export const listMailChoices = defineEndpoint({
  method: 'get',
  path: '/api/auth/mails',
  topic: 'Signing in',
  summary: 'Which mails the person signed in may receive and does.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(mailChoice) }),
  statuses: [200],
});

export const chooseMails = defineEndpoint({
  method: 'put',
  path: '/api/auth/mails',
  topic: 'Signing in',
  summary: 'Choose which mails to receive; kinds left out stay as they are.',
  access: EVERYONE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ items: z.array(mailChoice).max(MAIL_KINDS.length) }),
  out: z.strictObject({ items: z.array(mailChoice) }),
  statuses: [200],
});
