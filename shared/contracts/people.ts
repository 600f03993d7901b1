import * as z from 'zod';
import { password } from './auth';
import { defineEndpoint } from './endpoint';
import { code, HEAD_OFFICE, name, noParams, noQuery, role } from './fields';

const email = z.email('an e-mail address').max(254);
const placed = {
  regions: z.array(z.string().max(64)).max(200).optional(),
  branches: z.array(z.string().max(64)).max(2000).optional(),
};

export const person = z.strictObject({
  id: z.int(),
  email: z.string(),
  name: z.string(),
  role,
  regions: z.array(code),
  branches: z.array(code),
  active: z.boolean(),
  /** `true` until an invited person has set a password. */
  invited: z.boolean(),
  lastSignInAt: z.string().nullable(),
});

export const addPerson = defineEndpoint({
  method: 'post',
  path: '/api/people',
  topic: 'People',
  summary: 'Add a person; without a password an invitation is mailed.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ email, name, role, ...placed, password: password.optional() }),
  out: person,
  statuses: [201],
});

export const listPeople = defineEndpoint({
  method: 'get',
  path: '/api/people',
  topic: 'People',
  summary: 'Everybody with a sign-in.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(person) }),
  statuses: [200],
});

export const changePerson = defineEndpoint({
  method: 'put',
  path: '/api/people/:id',
  topic: 'People',
  summary: 'Change name, role, scope or activity; acts on the very next request (rule 64).',
  access: HEAD_OFFICE,
  scope: 'none',
  params: z.strictObject({ id: z.coerce.number().int().min(1) }),
  query: noQuery,
  body: z.strictObject({ name, role, ...placed, active: z.boolean().default(true) }),
  out: person,
  statuses: [200],
});

/** 409 when the person has a password already or is not active. */
export const inviteAgain = defineEndpoint({
  method: 'post',
  path: '/api/people/:id/invitation',
  topic: 'People',
  summary: 'Mail the invitation once more; the link mailed before stops working.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: z.strictObject({ id: z.coerce.number().int().min(1) }),
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});
