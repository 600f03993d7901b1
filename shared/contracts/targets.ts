import * as z from 'zod';
import { TARGET_MEASURES } from '#shared/domain/target-measures';
import { defineEndpoint } from './endpoint';
import { code, HEAD_OFFICE, noParams, noQuery, READERS } from './fields';

const measure = z.enum(TARGET_MEASURES);
/** In the unit of the measure: a ratio, claims per 1,000 car-years, a share of revenue. */
const value = z.number().nullable();

/** A target of the network or a branch; `value` null: none is set. */
export const target = z.strictObject({ measure, value });
/** What holds for a branch: its own (`own`), or else the network's (rule 80, for every measure). */
export const branchTarget = z.strictObject({
  branch: code,
  measure,
  own: value,
  holds: value,
});
export type BranchTarget = z.output<typeof branchTarget>;

const topic = 'Targets';
const changed = z.strictObject({ value: z.number().min(0).max(1000).nullable() });

export const listTargets = defineEndpoint({
  method: 'get',
  path: '/api/targets',
  topic,
  summary: 'Targets of the network, and of each branch in scope.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ network: z.array(target), branches: z.array(branchTarget) }),
  statuses: [200],
});

/** The margin's is the same as `targetMarginShare` of the network (rule 80). */
export const putNetworkTarget = defineEndpoint({
  method: 'put',
  path: '/api/targets/:measure',
  topic,
  summary: 'Set a target of the network, or take it away with null.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: z.strictObject({ measure }),
  query: noQuery,
  body: changed,
  out: target,
  statuses: [200],
});

export const putBranchTarget = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/targets/:measure',
  topic,
  summary: 'Set a target of a branch, or take it away with null.',
  access: { roles: ['regional_lead', 'head_office'], pushKey: false },
  scope: 'branches',
  params: z.strictObject({ branch: z.string(), measure }),
  query: noQuery,
  body: changed,
  out: branchTarget,
  statuses: [200],
});
