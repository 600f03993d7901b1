import {
  expectedMarginCents,
  marginCents,
  type ActualMoney,
  type ExpectedMoney,
} from './job-figures';

/** The steps between the margin that was expected and the one that was kept, in the order in which they are told. */
export const BRIDGE_STEPS = [
  'price',
  'plannedLabour',
  'rotLabour',
  'product',
  'consumables',
  'fee',
] as const;
export type BridgeStep = (typeof BRIDGE_STEPS)[number];

/** Each step is its effect on margin in cents, a cost above plan being negative (rule 3); they add up to the cent. */
export interface JobBridge {
  expectedMarginCents: number;
  priceCents: number;
  plannedLabourCents: number;
  rotLabourCents: number;
  productCents: number;
  consumablesCents: number;
  feeCents: number;
  marginCents: number;
}

/** The bridge of one billed job with an estimate and a norm. */
export function bridgeOf(actual: ActualMoney, expected: ExpectedMoney): JobBridge {
  return {
    expectedMarginCents: expectedMarginCents(expected),
    priceCents: actual.revenueCents - expected.priceCents,
    plannedLabourCents: expected.labourCents - actual.labourCents,
    rotLabourCents: expected.repairLabourCents - actual.repairLabourCents,
    productCents: expected.productCents - actual.productCents,
    consumablesCents: -(actual.consumablesCents + actual.boughtInCents) + 0,
    feeCents: expected.feeCents - actual.feeCents,
    marginCents: marginCents(actual),
  };
}

/** The step with the largest effect either way, the first told of equals; `undefined` when every step is 0. */
export function largestStep(
  bridge: Record<`${BridgeStep}Cents`, number>,
): { step: BridgeStep; cents: number } | undefined {
  let largest: { step: BridgeStep; cents: number } | undefined;
  for (const step of BRIDGE_STEPS) {
    const cents = bridge[`${step}Cents`];
    if (cents !== 0 && Math.abs(cents) > Math.abs(largest?.cents ?? 0)) largest = { step, cents };
  }
  return largest;
}
