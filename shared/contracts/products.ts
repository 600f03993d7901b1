import * as z from 'zod';
import { BODY_TYPES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  centsSum,
  code,
  date,
  missingCost,
  noParams,
  packageCode,
  period,
  READERS,
  scopeEcho,
  scopeQuery,
  share,
} from './fields';

/** Millilitres a car, unrounded; null below 5 cars (rule 13). */
const ml = share;

export const productUse = z.strictObject({
  product: code,
  package: packageCode,
  bodyType: z.enum(BODY_TYPES),
  /** With a norm every car of the package and body type, without one the cars that list the product (rule 37). */
  cars: z.int(),
  /** Of them, those on which any of it went in. */
  carsListing: z.int(),
  meanMl: ml,
  p10Ml: ml,
  p25Ml: ml,
  medianMl: ml,
  p75Ml: ml,
  p90Ml: ml,
  normMl: z.int().nullable(),
  /** Mean of the rounded line costs, rounded half up (rule 38); cars whose cost was not known are left out. */
  costPerCarCents: centsSum.nullable(),
  under: z.int().nullable(),
  over: z.int().nullable(),
  underShare: share,
  overShare: share,
});
export type ProductUse = z.output<typeof productUse>;

export const productBranch = z.strictObject({
  branch: code,
  cars: z.int(),
  /** Σ ml / Σ norm ml over normed products and cars with a norm (rule 39). */
  ratioToNorm: share,
  lower: share,
  upper: share,
});
export type ProductBranch = z.output<typeof productBranch>;

export const productTemperature = z.strictObject({
  product: code,
  cars: z.int(),
  /** Theil–Sen over cars listing it with a temperature (rule 40). */
  slopeMlPerDegree: share,
  lower: share,
  upper: share,
  /** Median use in classes of 5 °C, for the picture; `fromC` is the class's lower end. */
  classes: z.array(
    z.strictObject({ fromC: z.int(), cars: z.int(), p25Ml: ml, medianMl: ml, p75Ml: ml }),
  ),
});
export type ProductTemperature = z.output<typeof productTemperature>;

export const productsAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  withoutCost: z.int(),
  missingCosts: z.array(missingCost),
  /** All branches of the scope together. */
  overall: z.strictObject({
    cars: z.int(),
    ratioToNorm: share,
    lower: share,
    upper: share,
    /** Cars whose every product had a cost: those that the cost a car is the mean of. */
    costedCars: z.int(),
    costPerCarCents: centsSum.nullable(),
  }),
  use: z.array(productUse),
  branches: z.array(productBranch),
  temperature: z.array(productTemperature),
});
export type ProductsAnswer = z.output<typeof productsAnswer>;

export const getProducts = defineEndpoint({
  method: 'get',
  path: '/api/analytics/products',
  topic: 'Analytics',
  summary: 'Product a car by package and body type against the norm, by branch and by temperature.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: scopeQuery,
  body: null,
  out: productsAnswer,
  statuses: [200],
});

export const productNeed = z.strictObject({
  product: code,
  /** Expected millilitres over the eight weeks, and the range that holds it 95 times of 100. */
  ml: z.number(),
  lowerMl: z.number(),
  upperMl: z.number(),
  /** The same at today's cost a litre; null where none is known today. */
  costCents: centsSum.nullable(),
});
export type ProductNeed = z.output<typeof productNeed>;

export const productNeedAnswer = z.strictObject({
  /** The weeks behind usual cars and use a car. */
  period,
  scope: scopeEcho,
  jobs: z.int(),
  /** The eight whole weeks after this one. */
  coming: period,
  weeks: z.array(
    z.strictObject({
      week: z.string(),
      /** Cars in the diary of branches that keep one. */
      booked: z.int(),
      /** Cars that usually come and are not in the diary yet: stand-ins (rule 75). */
      usual: z.number(),
    }),
  ),
  needs: z.array(productNeed),
  /** Cars expected of a package and body type that has neither 5 cars behind it nor a norm: not in the sums. */
  carsWithoutUse: z.number(),
  missingCosts: z.array(z.strictObject({ product: code, on: date })),
});
export type ProductNeedAnswer = z.output<typeof productNeedAnswer>;

export const getProductNeed = defineEndpoint({
  method: 'get',
  path: '/api/analytics/product-need',
  topic: 'Analytics',
  summary:
    'Product that the coming eight weeks are expected to take, from bookings and usual cars.',
  access: READERS,
  scope: 'branches',
  params: noParams,
  query: scopeQuery,
  body: null,
  out: productNeedAnswer,
  statuses: [200],
});
