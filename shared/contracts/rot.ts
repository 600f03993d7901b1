import * as z from 'zod';
import { AGE_BANDS, SIDES, ZONES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import { code, noParams, period, READERS, scopeEcho, scopeQuery, share } from './fields';

const ageBand = z.enum(AGE_BANDS);
/** A share of cars with its Wilson interval; all three null below 5 cars (rule 13). */
const interval = { share, lower: share, upper: share };
const counted = { cars: z.int(), withRot: z.int(), ...interval };

export const rotCell = z.strictObject({ ageBand, region: code, ...counted });
export type RotCell = z.output<typeof rotCell>;

/** All regions of the scope together. */
export const rotBand = z.strictObject({
  ageBand,
  ...counted,
  /** The same share over the reference (rule 21); null where too little stands behind it. */
  referenceShare: share,
});
export type RotBand = z.output<typeof rotBand>;

export const rotRegion = z.strictObject({
  region: code,
  cars: z.int(),
  withRot: z.int(),
  share,
  /** Standardised directly to the reference's age mix, Fay–Feuer interval, upper end at most 1 (rule 35). */
  adjustedShare: share,
  adjustedLower: share,
  adjustedUpper: share,
  /** Age bands of the reference in which the region has no car: left out, the other weights stretched (rule 35). */
  bandsLeftOut: z.array(ageBand),
  corrosionRateUmPerYear: z.number().nullable(),
  corrosivityCategory: z.enum(['C1', 'C2', 'C3', 'C4', 'C5', 'CX']).nullable(),
  outsideFittedRange: z.boolean(),
});
export type RotRegion = z.output<typeof rotRegion>;

export const rotZone = z.strictObject({
  zone: z.enum(ZONES),
  ageBand,
  ...counted,
  /** The same by side: a car with rot left and right counts once in each and once in the zone (rule 32). */
  sides: z.array(z.strictObject({ side: z.enum(SIDES), withRot: z.int(), ...interval })),
});
export type RotZone = z.output<typeof rotZone>;

export const rotModel = z.strictObject({
  make: z.string(),
  model: z.string(),
  ageBand,
  cars: z.int(),
  withRot: z.int(),
  share,
  /** The share steadied toward all models of the age band (rule 34); shown for any number of cars. */
  shrunkShare: z.number(),
  lower: z.number(),
  upper: z.number(),
  /** The models differ no more than chance: every one gets the share of all. */
  pooled: z.boolean(),
});
export type RotModel = z.output<typeof rotModel>;

/** Of findings seen as bubbling and then worked, those worked as holed (rule 46); shares null below 5 findings. */
export const openedUp = z.strictObject({ worked: z.int(), holed: z.int(), ...interval });
export type OpenedUp = z.output<typeof openedUp>;

export const rotAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  reference: z.enum(['network', 'scope']),
  overall: z.strictObject(counted),
  bands: z.array(rotBand),
  cells: z.array(rotCell),
  regions: z.array(rotRegion),
  zones: z.array(rotZone),
  models: z.array(rotModel),
  openedUp,
});
export type RotAnswer = z.output<typeof rotAnswer>;

export const getRot = defineEndpoint({
  method: 'get',
  path: '/api/analytics/rot',
  topic: 'Analytics',
  summary: 'Share of cars with rot by age, region, zone and model, regions adjusted for age.',
  access: READERS,
  scope: 'network-reference',
  params: noParams,
  query: scopeQuery,
  body: null,
  out: rotAnswer,
  statuses: [200],
});
