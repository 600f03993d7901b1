import * as z from 'zod';
import { defineEndpoint, type EndpointScope } from './endpoint';
import {
  cents,
  code,
  date,
  EVERYONE,
  HEAD_OFFICE,
  line,
  millilitres,
  name,
  noParams,
  noQuery,
  packageCode,
  rate,
  READERS,
  bodyType,
  shareInput,
} from './fields';
import { CONSUMABLE_KINDS, PRODUCT_KINDS } from '#shared/domain/vocabulary';

const topic = 'Set-up';
/** Set-up touches no branch's jobs by name; what it restates is restated for all. */
const scope: EndpointScope = 'none';
const put = {
  method: 'put',
  topic,
  access: HEAD_OFFICE,
  scope,
  query: noQuery,
  statuses: [201, 200],
} as const;

export const climate = z.strictObject({
  /** Yearly mean, °C. */
  temperatureC: z.number().min(-60).max(60),
  /** Yearly mean relative humidity, %. */
  humidityPct: z.number().min(0).max(100),
  /** SO2 deposition, mg/(m²·d). */
  so2Deposition: z.number().min(0).max(10_000),
  /** Chloride deposition, mg/(m²·d). */
  chlorideDeposition: z.number().min(0).max(10_000),
});

export const region = z.strictObject({ code, name: z.string(), climate: climate.nullable() });
export const putRegion = defineEndpoint({
  ...put,
  path: '/api/regions/:code',
  summary: 'Create or change a region.',
  params: z.strictObject({ code }),
  body: z.strictObject({ name, climate: climate.optional() }),
  out: region,
});

const timeZone = line(64).refine(isTimeZone, 'an IANA time zone such as Europe/Lisbon');

export const branch = z.strictObject({
  code,
  name: z.string(),
  region: code,
  timeZone: z.string(),
  openedOn: date,
  closedOn: date.nullable(),
  targetMarginShare: z.number().nullable(),
});
export const putBranch = defineEndpoint({
  ...put,
  path: '/api/branches/:code',
  summary: 'Create or change a branch. Its history follows its present region (rule 53).',
  params: z.strictObject({ code }),
  body: z.strictObject({
    name,
    region: z.string().max(64),
    timeZone,
    openedOn: date,
    closedOn: date.nullable().optional(),
    targetMarginShare: shareInput.nullable().optional(),
  }),
  out: branch,
});

const restated = z.strictObject({ from: date, restatedJobs: z.int() });

export const putRate = defineEndpoint({
  ...put,
  path: '/api/branches/:code/rates/:from',
  summary: 'Hourly labour cost of a branch, valid from a date; restates the jobs it touches.',
  params: z.strictObject({ code, from: date }),
  body: z.strictObject({ hourlyCostCents: cents }),
  out: restated,
});

export const product = z.strictObject({ code, name: z.string(), kind: z.enum(PRODUCT_KINDS) });
export const putProduct = defineEndpoint({
  ...put,
  path: '/api/products/:code',
  summary: 'Create or change a product.',
  params: z.strictObject({ code }),
  body: z.strictObject({ name, kind: z.enum(PRODUCT_KINDS) }),
  out: product,
});

export const putProductCost = defineEndpoint({
  ...put,
  path: '/api/products/:code/costs/:from',
  summary: 'Cost of a product per litre, valid from a date; restates the jobs it touches.',
  params: z.strictObject({ code, from: date }),
  body: z.strictObject({ costPerLitreCents: cents }),
  out: restated,
});

export const consumableKind = z.enum(CONSUMABLE_KINDS);
export const putConsumableCost = defineEndpoint({
  ...put,
  path: '/api/consumables/:kind/costs/:from',
  summary: 'Unit cost of a consumable, valid from a date, used where a job gives none (rule 74).',
  params: z.strictObject({ kind: consumableKind, from: date }),
  body: z.strictObject({ unitCostCents: cents }),
  out: restated,
});

export const packageRow = z.strictObject({
  code: packageCode,
  name: z.string(),
  warrantyMonths: z.int(),
});
export const putPackage = defineEndpoint({
  ...put,
  path: '/api/packages/:code',
  summary: 'Create or change a package. Warranty already sold keeps its length (rule 10).',
  params: z.strictObject({ code: packageCode }),
  body: z.strictObject({ name, warrantyMonths: z.int().min(0).max(600) }),
  out: packageRow,
});

const normLines = z
  .array(z.strictObject({ product: z.string().max(64), ml: millilitres }))
  .max(100);
export const putNorms = defineEndpoint({
  ...put,
  path: '/api/packages/:code/norms/:bodyType',
  summary: 'Expected product for a package on a body type; the present norm restates all history.',
  params: z.strictObject({ code: packageCode, bodyType }),
  body: z.strictObject({ norms: normLines }),
  out: z.strictObject({
    package: packageCode,
    bodyType,
    norms: z.array(z.strictObject({ product: code, ml: millilitres })),
    restatedJobs: z.int(),
  }),
});

/** An ISO 4217 code whose minor unit is a hundredth. */
const currency = z.string().regex(/^[A-Z]{3}$/, 'an ISO 4217 currency code');
export const network = z.strictObject({
  name: z.string(),
  currency,
  /** The rate valid from the start; null until set. */
  feeRate: z.number().nullable(),
  targetMarginShare: z.number().nullable(),
  claimLimitCents: cents.nullable(),
});
export const putNetwork = defineEndpoint({
  ...put,
  path: '/api/network',
  summary: 'Name, currency, the fee rate valid from the start, targets and the claim limit.',
  params: noParams,
  body: z.strictObject({
    name,
    currency,
    feeRate: rate,
    targetMarginShare: shareInput.nullable().optional(),
    claimLimitCents: cents.nullable().optional(),
  }),
  out: network,
});

export const putFee = defineEndpoint({
  ...put,
  path: '/api/network/fees/:from',
  summary: 'Fee rate valid from a date; restates the jobs it touches.',
  params: z.strictObject({ from: date }),
  body: z.strictObject({ feeRate: rate }),
  out: restated,
});

/** What everyone signed in may read (rule 79). */
export const getCatalogue = defineEndpoint({
  method: 'get',
  path: '/api/catalogue',
  topic,
  summary:
    'Network name and currency, packages, products, norms, and the regions and branches in scope.',
  access: EVERYONE,
  scope: 'branches',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({
    network: z.strictObject({
      name: z.string(),
      currency,
      /** Above it head office decides a claim (rule 77), null: no limit. Absent for recorders. */
      claimLimitCents: cents.nullable().optional(),
    }),
    regions: z.array(region),
    branches: z.array(branch),
    packages: z.array(packageRow),
    products: z.array(product),
    norms: z.array(
      z.strictObject({
        package: packageCode,
        bodyType,
        norms: z.array(z.strictObject({ product: code, ml: millilitres })),
      }),
    ),
    /** Today in the scope (rule 9), so that a page need not ask its own clock. */
    today: date,
  }),
  statuses: [200],
});

/** Dated costs, not for recorders (rule 79). */
export const getCosts = defineEndpoint({
  method: 'get',
  path: '/api/costs',
  topic,
  summary:
    'Fee rates, product and consumable costs, and the hourly costs of the branches in scope.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: noQuery,
  body: null,
  out: z.strictObject({
    fees: z.array(z.strictObject({ from: date.nullable(), feeRate: z.number() })),
    rates: z.array(z.strictObject({ branch: code, from: date, hourlyCostCents: cents })),
    products: z.array(z.strictObject({ product: code, from: date, costPerLitreCents: cents })),
    consumables: z.array(
      z.strictObject({ kind: consumableKind, from: date, unitCostCents: cents }),
    ),
  }),
  statuses: [200],
});

function isTimeZone(zone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: zone });
    return zone.length > 0;
  } catch {
    return false;
  }
}
