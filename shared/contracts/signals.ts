import * as z from 'zod';
import { BRANCH_MEASURES, SIGNAL_KINDS, SIGNAL_STATES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  code,
  date,
  manyOf,
  month,
  noParams,
  noQuery,
  pageQuery,
  prose,
  READERS,
  scopeQuery,
} from './fields';

/** What a signal is made of: numbers and words by name, from which `tellSignal` makes its sentences in mail and page alike. */
export const signalFacts = z.record(
  z.string(),
  z.union([z.string(), z.number(), z.boolean(), z.null()]),
);

export const signal = z.strictObject({
  id: z.int(),
  branch: code,
  kind: z.enum(SIGNAL_KINDS),
  /** For `left_funnel`; null otherwise. */
  measure: z.enum(BRANCH_MEASURES).nullable(),
  state: z.enum(SIGNAL_STATES),
  /** First day (or Monday of the first week) of what it tells of. */
  since: date,
  /** When it was first noticed and when it was last still there. */
  openedOn: date,
  lastSeenOn: date,
  /** When it was over; null while it is not. */
  overOn: date.nullable(),
  /** How strong, by one number of its kind: σ beyond the limit, days, a count. Ordered within a kind only. */
  strength: z.number(),
  facts: signalFacts,
  /** Cars behind it. */
  cars: z.int(),
  acknowledged: z.strictObject({ by: z.string(), at: z.string(), note: z.string() }).nullable(),
});
export type Signal = z.output<typeof signal>;

/** A car behind a signal, as it stands today: one that was voided since is not listed. */
export const signalCar = z.strictObject({
  jobRef: z.string(),
  make: z.string(),
  model: z.string(),
  firstRegistered: month,
  completedOn: date,
  /** What is wrong with it, in a few words; empty where the signal says it all. */
  why: z.string(),
});
export type SignalCar = z.output<typeof signalCar>;

const topic = 'Signals';

export const listSignals = defineEndpoint({
  method: 'get',
  path: '/api/signals',
  topic,
  summary: 'What the nightly look found, what can hurt somebody first, then by branch.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: z.strictObject({
    region: scopeQuery.shape.region,
    branch: scopeQuery.shape.branch,
    /** Default: open and acknowledged. */
    state: manyOf(z.enum(SIGNAL_STATES)),
    kind: manyOf(z.enum(SIGNAL_KINDS)),
    ...pageQuery,
  }),
  body: null,
  out: z.strictObject({
    items: z.array(signal),
    nextCursor: z.string().nullable(),
    /** All that match, not only this page. */
    counts: z.strictObject({ open: z.int(), acknowledged: z.int(), over: z.int() }),
    /** Business day of the last look at the whole network; null before the first. */
    lookedOn: date.nullable(),
  }),
  statuses: [200],
});

const params = z.strictObject({ branch: z.string(), id: z.coerce.number().int().min(1) });

export const getSignal = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/signals/:id',
  topic,
  summary: 'One signal with the cars behind it (the first 200).',
  access: READERS,
  scope: 'branches',
  params,
  query: noQuery,
  body: null,
  out: signal.extend({ listed: z.array(signalCar) }),
  statuses: [200],
});

export const acknowledgeSignal = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/signals/:id/acknowledgement',
  topic,
  summary: 'Say that a signal has been seen and what is done about it.',
  access: READERS,
  scope: 'branches',
  params,
  query: noQuery,
  body: z.strictObject({ note: prose.refine((text) => text.trim() !== '', 'must not be empty') }),
  out: signal,
  statuses: [200],
});
