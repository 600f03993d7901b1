import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { noParams, period, READERS, scopeEcho, scopeQuery, share } from './fields';

export const OVERRUN_GROUPINGS = [
  'stage',
  'branch',
  'region',
  'ageBand',
  'package',
  'bodyType',
  'month',
  'rotFound',
] as const;
export type OverrunGrouping = (typeof OVERRUN_GROUPINGS)[number];

const figures = {
  cars: z.int(),
  estimatedMinutes: z.int(),
  actualMinutes: z.int(),
  /** Σ actual / Σ estimated; null below 5 cars or at 0 estimated minutes. */
  ratio: share,
  ratioStandardError: share,
  median: share,
  p80: share,
  p95: share,
  /** P80 of per-car ratios − 1, not clamped (rule 27). */
  allowance: share,
};
export const overrunOverall = z.strictObject(figures);
export const overrunGroup = z.strictObject({ key: z.string(), ...figures });
export type OverrunGroup = z.output<typeof overrunGroup>;

export const overrunAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  by: z.enum(OVERRUN_GROUPINGS),
  overall: overrunOverall,
  groups: z.array(overrunGroup),
  withoutEstimate: z.int(),
});
export type OverrunAnswer = z.output<typeof overrunAnswer>;

export const overrunQuery = scopeQuery.extend({
  by: z.enum(OVERRUN_GROUPINGS).default('stage'),
});

export const getOverrun = defineEndpoint({
  method: 'get',
  path: '/api/analytics/overrun',
  topic: 'Analytics',
  summary: 'Labour worked against labour estimated, with quantiles of the per-car ratio.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: overrunQuery,
  body: null,
  out: overrunAnswer,
  statuses: [200],
});
