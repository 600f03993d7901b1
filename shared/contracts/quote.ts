import * as z from 'zod';
import { AGE_BANDS, STAGES } from '#shared/domain/vocabulary';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  centsSum,
  code,
  date,
  EVERYONE,
  line,
  month,
  noParams,
  packageCode,
  share,
} from './fields';
import { openedUp } from './rot';

const named = line(60).refine((text) => text.trim().length > 0, 'must not be empty');
const wholeMinutes = z.int().nullable();

export const QUOTE_KINDS = ['model_age', 'body_age', 'age', 'package', 'none'] as const;

/** Why there is no price. */
export const NO_PRICE = ['no_cars', 'no_target', 'target_too_high', 'no_cost'] as const;

export const quoteQuery = z.strictObject({
  make: named,
  model: named,
  firstRegistered: month,
  bodyType,
  package: packageCode,
  branch: z.string().max(64),
  /** Share of the price to keep; absent: the branch's target. Not for recorders (rule 24). */
  marginShare: z
    .string()
    .regex(/^(0(\.\d{1,6})?|\.\d{1,6})$/, 'a share from 0 up to, not including, 1')
    .transform(Number)
    .optional(),
});

/** The set that an answer is made from (rule 48). */
export const quoteBasis = z.strictObject({
  kind: z.enum(QUOTE_KINDS),
  source: z.enum(['branch', 'network']).nullable(),
  cars: z.int(),
});

export const quoteAnswer = z.strictObject({
  /** Today at the branch. */
  on: date,
  ageBand: z.enum(AGE_BANDS),
  /** The nearest set with at least 30 cars (rule 48); `source` null and no cars when none reaches 30. */
  basis: quoteBasis,
  labour: z.strictObject({
    /** Quantiles of the cars' totals, rounded half up; those of the stages are each their own and do not add (rule 49). */
    p50Minutes: wholeMinutes,
    p80Minutes: wholeMinutes,
    stages: z.array(
      z.strictObject({
        stage: z.enum(STAGES),
        p50Minutes: wholeMinutes,
        p80Minutes: wholeMinutes,
      }),
    ),
  }),
  rot: z.strictObject({ cars: z.int(), withRot: z.int(), share, lower: share, upper: share }),
  openedUp,
  /** Mean millilitres a car of every product that went into any car of the set. */
  products: z.array(z.strictObject({ product: code, ml: z.number() })),
  priceCents: centsSum.nullable(),
  noPrice: z.enum(NO_PRICE).nullable(),
  /** What the price was made from, and how it moves with the margin; absent for recorders. */
  cost: z
    .strictObject({
      marginShare: share,
      marginFrom: z.enum(['asked', 'branch', 'network']).nullable(),
      feeRate: share,
      labourCents: centsSum.nullable(),
      productCents: centsSum.nullable(),
      consumablesAndBoughtInCents: centsSum.nullable(),
      /** Prices for margins from 0 in steps of 0.05, as far as fee and margin leave anything. */
      prices: z.array(z.strictObject({ marginShare: z.number(), priceCents: centsSum })),
      missingCosts: z.array(z.strictObject({ kind: z.string(), code: z.string() })),
    })
    .optional(),
});
export type QuoteAnswer = z.output<typeof quoteAnswer>;

export const getQuote = defineEndpoint({
  method: 'get',
  path: '/api/quote',
  topic: 'Quote',
  summary: 'What the next car is likely to take, from the nearest set of cars with its name.',
  access: EVERYONE,
  scope: 'network-reference',
  params: noParams,
  query: quoteQuery,
  body: null,
  out: quoteAnswer,
  statuses: [200],
});
