import * as z from 'zod';
import { BRANCH_MEASURES, FUNNEL_FLAGS } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  code,
  date,
  missingCost,
  noParams,
  period,
  READERS,
  scopeEcho,
  scopeQuery,
  share,
} from './fields';

const measure = z.enum(BRANCH_MEASURES);

/** A branch in its funnel (rules 42 to 44). Claims are per 1,000 car-years, everything else a share or ratio. */
export const branchStanding = z.strictObject({
  branch: code,
  region: code,
  /** Cars that the measure counts: estimated (overrun), all (rot), under warranty (claims), with a norm (product), billed (margin). */
  cars: z.int(),
  value: share,
  /** What the reference's rates by age band and package give for the branch's own mix of cars. */
  expected: share,
  lower95: share,
  upper95: share,
  lower998: share,
  upper998: share,
  flag: z.enum(FUNNEL_FLAGS),
  /** What the value divides by: estimated minutes, cars, car-years, norm ml, revenue in minor units. */
  denominator: z.number(),
  /** Claims only: how many were counted, and how many the reference's rates give. */
  claims: z.int().nullable(),
  expectedClaims: share,
  /** Target that holds for the branch, in the unit of the value; null where none is set. Beside the limits, never one of them. */
  target: z.number().nullable(),
});
export type BranchStanding = z.output<typeof branchStanding>;

/** How far a branch's record reaches, whatever was asked for. */
export const branchReceived = z.strictObject({
  branch: code,
  region: code,
  /** Newest `completedOn` among its jobs; null where none was ever received. */
  receivedThrough: date.nullable(),
  /** Instant at which a revision of one of its jobs was last received. */
  lastReceivedAt: z.string().nullable(),
});
export type BranchReceived = z.output<typeof branchReceived>;

const money = {
  /** Margin only (rule 11); 0 and [] otherwise. */
  withoutCost: z.int(),
  missingCosts: z.array(missingCost),
};

export const branchesAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  measure,
  reference: z.enum(['network', 'scope']),
  /** The measure over the whole reference, as counted. */
  network: share,
  /** Cars of the reference that the measure counts. */
  referenceCars: z.int(),
  ...money,
  branches: z.array(branchStanding),
  received: z.array(branchReceived),
});
export type BranchesAnswer = z.output<typeof branchesAnswer>;

export const branchesQuery = scopeQuery.extend({ measure: measure.default('overrun') });

const analytics = {
  method: 'get',
  topic: 'Analytics',
  access: READERS,
  params: noParams,
  body: null,
  statuses: [200],
} as const;

export const getBranches = defineEndpoint({
  ...analytics,
  path: '/api/analytics/branches',
  summary: 'Branches in the funnel of a measure, allowed for age band and package.',
  scope: 'network-reference',
  query: branchesQuery,
  out: branchesAnswer,
});

/** A week of a branch: `value` null below 5 cars (margin and claims are exempt, rule 13) or in an empty week. */
export const branchWeek = z.strictObject({
  week: z.string(),
  cars: z.int(),
  value: share,
  /** As the weekly chart says it (rule 6); null where there are no limits or the week is not over. */
  signal: z.enum(['outside_low', 'outside_high', 'run_low', 'run_high']).nullable(),
});
export const branchWeeks = z.strictObject({
  branch: code,
  weeks: z.array(branchWeek),
  /** From the branch's own weeks (rules 5 and 6 for any measure); null with fewer than 8 of them. Never for claims. */
  limits: z
    .strictObject({
      centre: z.number(),
      lower: z.number(),
      upper: z.number(),
      baselineWeeks: z.int(),
    })
    .nullable(),
  target: z.number().nullable(),
});
export type BranchWeeks = z.output<typeof branchWeeks>;

/** Claims: `value` is the number of counted claims made in that week, whenever the car was finished; `cars` those under warranty then. */
export const branchWeeksAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  measure,
  branches: z.array(branchWeeks),
});
export type BranchWeeksAnswer = z.output<typeof branchWeeksAnswer>;

export const getBranchWeeks = defineEndpoint({
  ...analytics,
  path: '/api/analytics/branches/weeks',
  summary: 'The weeks of each branch in a measure, with the usual range of its own.',
  scope: 'branches',
  query: branchesQuery,
  out: branchWeeksAnswer,
});

/**
 * A step from the reference's value to the branch's. `mix`: other cars (age bands, packages) than the reference's; the others are
 * parts of the value by what they are in that measure: stages of labour (overrun), age bands (rot), causes (claims), products
 * (product), or lines of cost (margin). Each is the branch's part minus what the reference's rates give for its own cars.
 */
export const comparedStep = z.strictObject({ key: z.string(), value: z.number() });
export const comparedBranch = z.strictObject({
  branch: code,
  region: code,
  cars: z.int(),
  value: share,
  expected: share,
  flag: z.enum(FUNNEL_FLAGS),
  /** network + Σ steps = value; null where the value is. */
  steps: z.array(comparedStep).nullable(),
});
export type ComparedBranch = z.output<typeof comparedBranch>;

export const sideBySideAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  measure,
  reference: z.enum(['network', 'scope']),
  network: share,
  ...money,
  branches: z.array(comparedBranch),
});
export type SideBySideAnswer = z.output<typeof sideBySideAnswer>;

/** Compares the branches asked for; the page asks for two to four, any number is answered. */
export const getSideBySide = defineEndpoint({
  ...analytics,
  path: '/api/analytics/branches/side-by-side',
  summary: 'What sets branches apart from the reference, in steps that add up.',
  scope: 'network-reference',
  query: branchesQuery,
  out: sideBySideAnswer,
});
