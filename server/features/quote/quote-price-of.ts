import type { QuoteAnswer } from '#shared/contracts/quote';
import { rateOfMicros } from '#shared/domain/money';
import {
  leavesNothing,
  quotePrice,
  roundedHalfUp,
  type Fraction,
  type QuoteCost,
} from '#shared/domain/quote-price';
import type { QuoteCosts } from './quote-costs';

/** The margin that a price is to leave, and whose it is. */
export interface WantedMargin {
  share: number | null;
  from: 'asked' | 'branch' | 'network' | null;
}

type Priced = Pick<QuoteAnswer, 'priceCents' | 'noPrice'> & {
  cost: NonNullable<QuoteAnswer['cost']>;
};

/** Prices are shown for margins from 0 in steps of a twentieth. */
const STEPS = 20;

/** The price for the wanted margin, or why there is none, and what it was made from (rule 49). No set of cars: no costs. */
export function quotePriceOf(
  costs: QuoteCosts | undefined,
  feeMicros: number | undefined,
  wanted: WantedMargin,
): Priced {
  const feeRate = feeMicros === undefined ? null : rateOfMicros(feeMicros);
  const known = costs && feeRate !== null ? everyLine(costs) : undefined;
  const noPrice = reasonOf(costs, known, feeRate, wanted);
  const price =
    noPrice === null && known ? quotePrice(known, feeRate ?? 0, wanted.share ?? 0) : undefined;
  return {
    priceCents: price ?? null,
    noPrice: noPrice ?? (price === undefined ? 'target_too_high' : null),
    cost: {
      marginShare: wanted.share,
      marginFrom: wanted.from,
      feeRate,
      labourCents: told(costs?.labour),
      productCents: told(costs?.product),
      consumablesAndBoughtInCents: told(costs?.consumablesAndBoughtIn),
      prices: known && feeRate !== null ? pricesOf(known, feeRate) : [],
      missingCosts: costs?.missing ?? [],
    },
  };
}

/** The first thing that stands in the way: what a person can mend last of all is told last. */
function reasonOf(
  costs: QuoteCosts | undefined,
  known: QuoteCost | undefined,
  feeRate: number | null,
  { share }: WantedMargin,
): QuoteAnswer['noPrice'] {
  if (!costs) return 'no_cars';
  if (share === null) return 'no_target';
  if (feeRate !== null && leavesNothing(feeRate, share)) return 'target_too_high';
  return known ? null : 'no_cost';
}

function everyLine({ labour, product, consumablesAndBoughtIn }: QuoteCosts): QuoteCost | undefined {
  return labour && product && consumablesAndBoughtIn
    ? { labour, product, consumablesAndBoughtIn }
    : undefined;
}

function pricesOf(cost: QuoteCost, feeRate: number): Priced['cost']['prices'] {
  return Array.from({ length: STEPS }, (_, step) => step / STEPS).flatMap((marginShare) => {
    const priceCents = quotePrice(cost, feeRate, marginShare);
    return priceCents === undefined ? [] : [{ marginShare, priceCents }];
  });
}

function told(line: Fraction | undefined): number | null {
  return line ? roundedHalfUp(line) : null;
}
