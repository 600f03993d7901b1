import * as z from 'zod';
import { ACTION_STATES, BRANCH_MEASURES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  code,
  date,
  manyOf,
  name,
  noParams,
  noQuery,
  pageQuery,
  prose,
  READERS,
  scopeQuery,
  share,
} from './fields';

const measure = z.enum(BRANCH_MEASURES);
const said = prose.refine((text) => text.trim() !== '', 'must not be empty');
/** Head office and leads agree; the manager answers (rule 78). */
const LEADS = { roles: ['regional_lead', 'head_office'], pushKey: false } as const;

/** An answer of the branch, oldest first; nothing said is taken back. */
export const actionAnswer = z.strictObject({ by: z.string(), at: z.string(), text: z.string() });

export const action = z.strictObject({
  branch: code,
  id: z.int(),
  what: z.string(),
  /** Who does it, in words. */
  who: z.string(),
  until: date,
  /** Figure to watch. */
  measure,
  state: z.enum(ACTION_STATES),
  agreedOn: date,
  agreedBy: z.string(),
  /** Day on which it was done or dropped; null while it is agreed. */
  endedOn: date.nullable(),
  /** Past `until` and not ended. */
  late: z.boolean(),
  /** The signal it answers, if any. */
  signal: z.int().nullable(),
  answers: z.array(actionAnswer),
});
export type Action = z.output<typeof action>;

/** The measure in some weeks: as counted, with its 95 % interval, and what the reference gives for the cars of those weeks. */
export const watchedSide = z.strictObject({
  from: date,
  to: date,
  cars: z.int(),
  value: share,
  lower: share,
  upper: share,
  expected: share,
});
export type WatchedSide = z.output<typeof watchedSide>;

/** Before and after an action: the 26 weeks up to the day before it, and from its day to today or at most 26 weeks on. */
export const actionEffect = z.strictObject({
  measure,
  reference: z.enum(['network', 'scope']),
  before: watchedSide,
  after: watchedSide,
  /** (value − expected) after minus (value − expected) before, with its 95 % interval; null where too few cars stand on a side. */
  change: share,
  lower: share,
  upper: share,
});
export type ActionEffect = z.output<typeof actionEffect>;

const topic = 'Actions';
const params = z.strictObject({ branch: z.string(), id: z.coerce.number().int().min(1) });
const common = { topic, scope: 'branches', query: noQuery } as const;

export const listActions = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/actions',
  summary: 'Actions agreed with branches: those under way first, the earliest due first.',
  access: READERS,
  params: noParams,
  query: z.strictObject({
    region: scopeQuery.shape.region,
    branch: scopeQuery.shape.branch,
    state: manyOf(z.enum(ACTION_STATES)),
    ...pageQuery,
  }),
  body: null,
  out: z.strictObject({
    items: z.array(action),
    nextCursor: z.string().nullable(),
    counts: z.strictObject({ agreed: z.int(), late: z.int(), done: z.int(), dropped: z.int() }),
  }),
  statuses: [200],
});

export const getAction = defineEndpoint({
  ...common,
  method: 'get',
  path: '/api/branches/:branch/actions/:id',
  summary: 'One action with its measure before and after.',
  access: READERS,
  scope: 'network-reference',
  params,
  body: null,
  out: action.extend({ effect: actionEffect }),
  statuses: [200],
});

export const agreeAction = defineEndpoint({
  ...common,
  method: 'post',
  path: '/api/branches/:branch/actions',
  summary: 'Agree an action with a branch.',
  access: LEADS,
  params: z.strictObject({ branch: z.string() }),
  body: z.strictObject({
    what: said,
    who: name,
    until: date,
    measure,
    signal: z.int().min(1).optional(),
  }),
  out: action,
  statuses: [201],
});

/** What is left out stays. `done` and `dropped` end it today; `agreed` takes it up again. */
export const changeAction = defineEndpoint({
  ...common,
  method: 'put',
  path: '/api/branches/:branch/actions/:id',
  summary: 'Change an action, or say that it is done or dropped.',
  access: LEADS,
  params,
  body: z.strictObject({
    what: said.optional(),
    who: name.optional(),
    until: date.optional(),
    measure: measure.optional(),
    state: z.enum(ACTION_STATES).optional(),
  }),
  out: action,
  statuses: [200],
});

export const answerAction = defineEndpoint({
  ...common,
  method: 'post',
  path: '/api/branches/:branch/actions/:id/answers',
  summary: 'Answer an action as the branch.',
  access: { roles: ['site_manager'], pushKey: false },
  params,
  body: z.strictObject({ text: said }),
  out: action,
  statuses: [201],
});
