import type { QuoteAnswer } from '#shared/contracts/quote';
import { STAGES } from '#shared/domain/vocabulary';

/** A quote from 41 cars of the model at the branch, priced for its target of 35 %, unless said. */
export function quoteAnswer(more: Partial<QuoteAnswer> = {}): QuoteAnswer {
  const perMargin = (marginShare: number): number => Math.ceil(51_200 / (1 - 0.06 - marginShare));
  return {
    on: '2026-02-02',
    ageBand: '15-19',
    basis: { kind: 'model_age', source: 'branch', cars: 41 },
    labour: {
      p50Minutes: 440,
      p80Minutes: 580,
      stages: STAGES.map((stage, index) => ({
        stage,
        p50Minutes: stage === 'dry' ? 0 : 40 + index * 8,
        p80Minutes: stage === 'dry' ? 0 : 70 + index * 12,
      })),
    },
    rot: { cars: 41, withRot: 26, share: 26 / 41, lower: 0.48, upper: 0.764 },
    openedUp: { worked: 19, holed: 8, share: 8 / 19, lower: 0.231, upper: 0.637 },
    products: [
      { product: 'CW1', ml: 3940 },
      { product: 'UW1', ml: 4120 },
    ],
    priceCents: perMargin(0.35),
    noPrice: null,
    cost: {
      marginShare: 0.35,
      marginFrom: 'branch',
      feeRate: 0.06,
      labourCents: 40_600,
      productCents: 9_400,
      consumablesAndBoughtInCents: 1_200,
      prices: Array.from({ length: 19 }, (_, step) => ({
        marginShare: step / 20,
        priceCents: perMargin(step / 20),
      })).filter(({ marginShare }) => marginShare < 0.94),
      missingCosts: [],
    },
    ...more,
  };
}
