import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  centsSum,
  missingCost,
  noParams,
  period,
  READERS,
  scopeEcho,
  scopeQuery,
  share,
} from './fields';

export const WEEK_SIGNALS = ['outside_low', 'outside_high', 'run_low', 'run_high'] as const;

export const marginWeek = z.strictObject({
  week: z.string(),
  jobs: z.int(),
  unbilled: z.int(),
  unbilledCostCents: centsSum,
  revenueCents: centsSum,
  labourCents: centsSum,
  productCents: centsSum,
  consumablesCents: centsSum,
  boughtInCents: centsSum,
  feeCents: centsSum,
  marginCents: centsSum,
  marginShare: share,
  expectedMarginCents: centsSum,
  signal: z.enum(WEEK_SIGNALS).nullable(),
  /** `false` for a week cut by the period or not over yet (rule 7). */
  whole: z.boolean(),
});
export type MarginWeek = z.output<typeof marginWeek>;

export const bridge = z.strictObject({
  cars: z.int(),
  expectedMarginCents: centsSum,
  priceCents: centsSum,
  plannedLabourCents: centsSum,
  rotLabourCents: centsSum,
  productCents: centsSum,
  consumablesCents: centsSum,
  feeCents: centsSum,
  marginCents: centsSum,
});
export type Bridge = z.output<typeof bridge>;

export const marginAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  withoutCost: z.int(),
  missingCosts: z.array(missingCost),
  weeks: z.array(marginWeek),
  limits: z
    .strictObject({
      centre: z.number(),
      lower: z.number(),
      upper: z.number(),
      baselineWeeks: z.int(),
    })
    .nullable(),
  trend: z.strictObject({ slopePerWeek: z.number(), p: z.number() }).nullable(),
  bridge,
  /** The target that holds (rule 80): a single branch's own, else the network's; null when none is set. */
  targetMarginShare: z.number().nullable(),
});
export type MarginAnswer = z.output<typeof marginAnswer>;

export const getMargin = defineEndpoint({
  method: 'get',
  path: '/api/analytics/margin',
  topic: 'Analytics',
  summary: 'Weekly margin with limits, signals, trend and the bridge from expected to kept.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: scopeQuery,
  body: null,
  out: marginAnswer,
  statuses: [200],
});
