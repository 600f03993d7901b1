import * as z from 'zod';
import { AGE_BANDS, CHECKS, CLAIM_CAUSES, ZONES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  centsSum,
  code,
  date,
  manyOf,
  noParams,
  packageCode,
  period,
  READERS,
  scopeEcho,
  scopeQuery,
  share,
} from './fields';

/** What claim-free curves can be told apart by. */
export const CURVE_GROUPS = ['package', 'region', 'branch', 'ageBand', 'cohort'] as const;
export type CurveGroup = (typeof CURVE_GROUPS)[number];
/** Most curves drawn and compared at once. */
export const MOST_CURVES = 4;

const ageBand = z.enum(AGE_BANDS);
/** A calendar half-year, `2024-H1`. */
export const halfYear = z.string().regex(/^\d{4}-H[12]$/, 'a half-year is written 2024-H1');
/** An estimate with its 95 % interval. */
const interval = { lower: share, upper: share };

/** Claims against car-years of cover (rules 14 and 16), exact Poisson interval; null without exposure (rule 47). */
export const claimRate = z.strictObject({
  claims: z.int(),
  carYears: z.number(),
  per1000: share,
  ...interval,
});

/** One month since completion (rule 17). */
export const claimFreeMonth = z.strictObject({
  month: z.int(),
  atRisk: z.int(),
  /** Cars whose first claim fell in the month. */
  claims: z.int(),
  /** Share of cars still without a claim at the end of the month; null while fewer than 5 were at risk. */
  share,
  ...interval,
});
export type ClaimFreeMonth = z.output<typeof claimFreeMonth>;

export const claimFreeGroup = z.strictObject({
  key: z.string(),
  cars: z.int(),
  /** Cars with a claim: what the months' claims add up to. */
  claims: z.int(),
  months: z.array(claimFreeMonth),
});
export type ClaimFreeGroup = z.output<typeof claimFreeGroup>;

/** The log-rank test over the groups shown, with the sums it is made of. */
export const logRankTest = z.strictObject({
  chiSquare: z.number(),
  degreesOfFreedom: z.int(),
  p: z.number(),
  groups: z.array(z.strictObject({ key: z.string(), observed: z.int(), expected: z.number() })),
});

/** Observed against expected (rule 20): exact interval of the ratio; ratio null where nothing was expected (rule 47). */
const againstExpected = { claims: z.int(), expected: z.number(), ratio: share, ...interval };

/** Cars finished in one calendar half-year (rule 18). */
export const warrantyCohort = z.strictObject({
  cohort: halfYear,
  cars: z.int(),
  latestCents: centsSum,
  ultimateCents: centsSum,
  outstandingCents: centsSum,
  standardErrorCents: centsSum.nullable(),
  /** Its claims against the reference's rates: whether the cohort itself is unlike others. */
  ...againstExpected,
});
export type WarrantyCohort = z.output<typeof warrantyCohort>;

/** A factor from one development half-year to the next, with the sums it is made of: `factor = toCents / fromCents`. */
export const developmentFactor = z.strictObject({
  /** From this development half-year (0: the cohort's own) to the next. */
  development: z.int(),
  fromCents: centsSum,
  toCents: centsSum,
  factor: z.number(),
  /** Mack's variance parameter, in cents; null where it is not defined (rule 19). */
  sigmaSquared: z.number().nullable(),
});
export type DevelopmentFactor = z.output<typeof developmentFactor>;

export const paidTriangle = z.strictObject({
  /** Paid in all up to each development half-year, in cents, a row a cohort, oldest first. */
  rows: z.array(z.strictObject({ cohort: halfYear, cumulativeCents: z.array(centsSum) })),
  factors: z.array(developmentFactor),
});

export const warrantyBranch = z.strictObject({
  branch: code,
  cars: z.int(),
  carYears: z.number(),
  ...againstExpected,
});
export type WarrantyBranch = z.output<typeof warrantyBranch>;

/** A rate that expectations are made of: one package, age band and year in service. */
export const expectedRate = z.strictObject({
  package: packageCode,
  ageBand,
  /** 1: the first year after completion. */
  yearInService: z.int(),
  /** Of the reference; null where fewer than five other branches stand behind this cell and the caller is not head office. */
  claims: z.int().nullable(),
  carYears: z.number().nullable(),
  /** Car-years of the answer's own rows. */
  ownCarYears: z.number(),
});
export type ExpectedRate = z.output<typeof expectedRate>;

/** Cars and claims within 24 months of an age band, by how something was done (rule 45). */
const stratum = z.strictObject({
  ageBand,
  exposedCars: z.int(),
  exposedClaims: z.int(),
  unexposedCars: z.int(),
  unexposedClaims: z.int(),
});

/** Pooled over age bands by Mantel–Haenszel; null where it is not defined. */
const pooledRisk = {
  riskRatio: share,
  ...interval,
  /** Age bands in which both groups have cars. */
  strata: z.int(),
  tables: z.array(stratum),
};

export const processRisk = z.strictObject({ check: z.enum(CHECKS), ...pooledRisk });
export type ProcessRisk = z.output<typeof processRisk>;

/** Where claims sit: by zone and by cause. */
const placed = { claims: z.int(), costCents: centsSum };

export const warrantyAnswer = z.strictObject({
  period,
  scope: scopeEcho,
  jobs: z.int(),
  reference: z.enum(['network', 'scope']),
  asOf: date,
  /** The last half-year's end up to asOf: up to here payments are counted (rule 18). Of the first days of year 1000 it is a day that no input may name. */
  evaluatedOn: z.string(),
  /** Cars sold with a warranty. */
  covered: z.int(),
  rate: claimRate,
  claimFree: z.array(claimFreeMonth),
  groupBy: z.enum(CURVE_GROUPS),
  /** The groups asked for, else those with the most cars; at most four, in the order of their key. */
  groups: z.array(claimFreeGroup),
  /** Every group there is, with its cars. */
  everyGroup: z.array(z.strictObject({ key: z.string(), cars: z.int() })),
  /** Null with fewer than two groups, or no claim. */
  logRank: logRankTest.nullable(),
  cohorts: z.array(warrantyCohort),
  total: z.strictObject({
    latestCents: centsSum,
    ultimateCents: centsSum,
    outstandingCents: centsSum,
    standardErrorCents: centsSum.nullable(),
  }),
  triangle: paidTriangle,
  branches: z.array(warrantyBranch),
  expectedRates: z.array(expectedRate),
  process: z.array(processRisk),
  /** The same for cars that got under 70 % of their norm of all normed products together, against those that did not. */
  thinProduct: z.strictObject(pooledRisk),
  causes: z.array(z.strictObject({ cause: z.enum(CLAIM_CAUSES), ...placed })),
  zones: z.array(z.strictObject({ zone: z.enum(ZONES), ...placed })),
  /** What stands outside the figures, counted. */
  left: z.strictObject({
    carsWithoutWarranty: z.int(),
    claimsAfterEnd: z.int(),
    claimsRefused: z.int(),
    claimsWaiting: z.int(),
    paidAfterEvaluationCents: centsSum,
  }),
});
export type WarrantyAnswer = z.output<typeof warrantyAnswer>;

/** from/to choose jobs by completion and default to the first job … asOf (rule 15). */
export const warrantyQuery = scopeQuery.extend({
  asOf: date.optional(),
  groupBy: z.enum(CURVE_GROUPS).default('package'),
  group: manyOf(z.string().max(64)),
});

export const getWarranty = defineEndpoint({
  method: 'get',
  path: '/api/analytics/warranty',
  topic: 'Analytics',
  summary:
    'Claims: rate, claim-free shares, cost still to come, observed against expected, process checks; as of any past day.',
  access: READERS,
  scope: 'network-reference',
  params: noParams,
  query: warrantyQuery,
  body: null,
  out: warrantyAnswer,
  statuses: [200],
});
