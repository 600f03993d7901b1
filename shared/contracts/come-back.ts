import * as z from 'zod';
import { COME_BACK_STATUSES, CONDITIONS, SIDES, ZONES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  code,
  date,
  EVERYONE,
  manyOf,
  month,
  noParams,
  noQuery,
  pageQuery,
  prose,
  READERS,
  reference,
  scopeQuery,
} from './fields';

const marks = {
  status: z.enum(COME_BACK_STATUSES),
  /** When it should be looked at again; null until a person sets it (rule 61). */
  dueOn: date.nullable(),
  note: z.string(),
  /** The day on which the owner was told in writing. */
  ownerToldOn: date.nullable(),
};

/** A finding that was left on a car: deferred or declined. */
export const comeBack = z.strictObject({
  branch: code,
  jobRef: z.string(),
  ref: z.string(),
  vehicle: z.strictObject({
    key: z.string().optional(),
    make: z.string(),
    model: z.string(),
    bodyType,
    firstRegistered: month,
  }),
  zone: z.enum(ZONES),
  side: z.enum(SIDES),
  seenAs: z.enum(CONDITIONS),
  workedAs: z.enum(CONDITIONS).nullable(),
  structural: z.boolean(),
  action: z.enum(['deferred', 'declined']),
  completedOn: date,
  ...marks,
  changedBy: z.string().nullable(),
  changedAt: z.string().nullable(),
  /** The later job of the same car that treated or patched the same place (rule 72): closed by itself, reopened when that job is voided. */
  closedByJobRef: z.string().nullable(),
});
export type ComeBack = z.output<typeof comeBack>;

/** One mark a person has set, oldest first. */
export const comeBackChange = z.strictObject({
  ...marks,
  changedBy: z.string(),
  changedAt: z.string(),
});
export type ComeBackChange = z.output<typeof comeBackChange>;

export const comeBackQuery = scopeQuery.extend({
  /** Default: open, contacted, booked (rule 61). */
  status: manyOf(z.enum(COME_BACK_STATUSES)),
  ...pageQuery,
});

export const listComeBack = defineEndpoint({
  method: 'get',
  path: '/api/come-back',
  topic: 'Come-backs',
  summary: 'Rot left on cars, the dangerous first. No default period.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: comeBackQuery,
  body: null,
  out: z.strictObject({
    items: z.array(comeBack),
    nextCursor: z.string().nullable(),
    /** All that match, not only this page. */
    findings: z.int(),
    /** Of them, structural rot: bubbling or holed where the car bears load. */
    dangerous: z.int(),
    /** Of the dangerous, those whose owner has not been told in writing. */
    dangerousNotTold: z.int(),
    cars: z.int(),
  }),
  statuses: [200],
});

const params = z.strictObject({ branch: z.string(), jobRef: reference, ref: reference });

export const getComeBack = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/come-back/:jobRef/:ref',
  topic: 'Come-backs',
  summary: 'One finding left on a car, with every mark that was set on it.',
  access: EVERYONE,
  scope: 'branches',
  params,
  query: noQuery,
  body: null,
  out: comeBack.extend({ changes: z.array(comeBackChange) }),
  statuses: [200],
});

/** What is left out stays as it was; `null` takes a date or note away (as with an invoice, rule 73). */
export const comeBackMark = z.strictObject({
  status: z.enum(COME_BACK_STATUSES),
  dueOn: date.nullable().optional(),
  note: prose.nullable().optional(),
  ownerToldOn: date.nullable().optional(),
});
export type ComeBackMark = z.output<typeof comeBackMark>;

export const putComeBack = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/come-back/:jobRef/:ref',
  topic: 'Come-backs',
  summary: 'Mark a finding left on a car: contacted, booked, done or gone.',
  access: { roles: ['recorder', 'site_manager', 'head_office'], pushKey: false },
  scope: 'branches',
  params,
  query: noQuery,
  body: comeBackMark,
  out: comeBack,
  statuses: [200],
});
