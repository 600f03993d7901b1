import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  cents,
  code,
  date,
  HEAD_OFFICE,
  millilitres,
  noParams,
  noQuery,
  packageCode,
  rate,
} from './fields';
import { consumableKind, network } from './set-up';

const topic = 'Set-up';

export const getNetwork = defineEndpoint({
  method: 'get',
  path: '/api/network',
  topic,
  summary: 'The network as set up: name, currency, base fee, target and claim limit.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: null,
  out: network,
  statuses: [200],
});

/** Figures that a change of set-up can move; words for them are the pages'. */
export const MOVED_FIGURES = [
  'margin',
  'expected_margin',
  'bridge',
  'product_against_norm',
  'quote_price',
  'product_need',
  'region_comparison',
  'corrosivity',
  'new_warranties',
] as const;

/** A change of set-up as it would be made. */
export const plannedChange = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('rate'),
    branch: z.string().max(64),
    from: date,
    hourlyCostCents: cents,
  }),
  z.strictObject({
    kind: z.literal('productCost'),
    product: z.string().max(64),
    from: date,
    costPerLitreCents: cents,
  }),
  z.strictObject({
    kind: z.literal('consumableCost'),
    consumable: consumableKind,
    from: date,
    unitCostCents: cents,
  }),
  /** `from` null: the rate valid from the start. */
  z.strictObject({ kind: z.literal('fee'), from: date.nullable(), feeRate: rate }),
  z.strictObject({
    kind: z.literal('norm'),
    package: z.string().max(64),
    bodyType,
    norms: z.array(z.strictObject({ product: z.string().max(64), ml: millilitres })).max(100),
  }),
  z.strictObject({
    kind: z.literal('warranty'),
    package: z.string().max(64),
    warrantyMonths: z.int().min(0).max(600),
  }),
  z.strictObject({
    kind: z.literal('branchRegion'),
    branch: z.string().max(64),
    region: z.string().max(64),
  }),
  z.strictObject({ kind: z.literal('climate'), region: z.string().max(64) }),
]);
export type PlannedChange = z.output<typeof plannedChange>;

/** Asked before a change is made; writes nothing. */
export const tellEffect = defineEndpoint({
  method: 'post',
  path: '/api/set-up/effect',
  topic,
  summary: 'Which cars and which figures a change of set-up would move. Writes nothing.',
  access: HEAD_OFFICE,
  scope: 'none',
  params: noParams,
  query: noQuery,
  body: z.strictObject({ change: plannedChange }),
  out: z.strictObject({
    /** Cars whose figures would be computed anew. */
    jobs: z.int(),
    branches: z.int(),
    /** Completion of the first and the last of them. */
    from: date.nullable(),
    to: date.nullable(),
    /** What those cars keep now and would keep then, billed and with every cost known; null where no money moves. */
    marginCents: z.strictObject({ before: z.int(), after: z.int() }).nullable(),
    figures: z.array(z.enum(MOVED_FIGURES)),
  }),
  statuses: [200],
});
export type Effect = z.output<typeof tellEffect.out>;

export const getNormMedians = defineEndpoint({
  method: 'get',
  path: '/api/packages/:code/norms/:bodyType/medians',
  topic,
  summary:
    "The network's own product per car for a package and body type over the last 52 weeks, to take a norm from.",
  access: HEAD_OFFICE,
  scope: 'branches',
  params: z.strictObject({ code: packageCode, bodyType }),
  query: noQuery,
  body: null,
  out: z.strictObject({
    from: date,
    to: date,
    cars: z.int(),
    products: z.array(
      z.strictObject({
        product: code,
        /** Cars that list it. */
        cars: z.int(),
        medianMl: z.number().nullable(),
        p10Ml: z.number().nullable(),
        p90Ml: z.number().nullable(),
      }),
    ),
  }),
  statuses: [200],
});

/** How much hangs on a row of the catalogue, and so whether it may be taken out. */
const removal = {
  method: 'delete',
  topic,
  access: HEAD_OFFICE,
  scope: 'none',
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
} as const;

export const removeProduct = defineEndpoint({
  ...removal,
  path: '/api/products/:code',
  summary:
    'Take a product out that no job, norm or cost refers to; 409 otherwise, saying what does.',
  params: z.strictObject({ code }),
});

export const removePackage = defineEndpoint({
  ...removal,
  path: '/api/packages/:code',
  summary: 'Take a package out that no job, norm or booking refers to; 409 otherwise.',
  params: z.strictObject({ code: packageCode }),
});
