import fc from 'fast-check';
import { bridgeOf, BRIDGE_STEPS, largestStep } from './bridge';
import type { ActualMoney, ExpectedMoney } from './job-figures';

const cents = fc.nat(1_000_000_000);
const actual: fc.Arbitrary<ActualMoney> = fc.record({
  revenueCents: cents,
  labourCents: cents,
  repairLabourCents: cents,
  productCents: cents,
  consumablesCents: cents,
  boughtInCents: cents,
  feeCents: cents,
});
const expected: fc.Arbitrary<ExpectedMoney> = fc.record({
  priceCents: cents,
  labourCents: cents,
  repairLabourCents: cents,
  productCents: cents,
  feeCents: cents,
});

describe('bridgeOf', () => {
  it('given any job, its six steps lead from the expected margin to the kept one to the cent (rule 3)', () => {
    fc.assert(
      fc.property(actual, expected, (a, e) => {
        const bridge = bridgeOf(a, e);
        const steps = BRIDGE_STEPS.map((step) => bridge[`${step}Cents`]);
        const sum = steps.reduce((all, step) => all + step, bridge.expectedMarginCents);
        expect(sum).toBe(bridge.marginCents);
      }),
    );
  });

  it('given a job that cost more than planned, shows each step as its effect on margin', () => {
    const bridge = bridgeOf(
      {
        revenueCents: 900,
        labourCents: 300,
        repairLabourCents: 100,
        productCents: 50,
        consumablesCents: 7,
        boughtInCents: 5,
        feeCents: 45,
      },
      { priceCents: 800, labourCents: 250, repairLabourCents: 0, productCents: 60, feeCents: 40 },
    );
    expect(bridge).toEqual({
      expectedMarginCents: 450,
      priceCents: 100,
      plannedLabourCents: -50,
      rotLabourCents: -100,
      productCents: 10,
      consumablesCents: -12,
      feeCents: -5,
      marginCents: 393,
    });
  });

  it('given no consumables, says 0 and not a negative one', () => {
    const nothing = {
      revenueCents: 0,
      labourCents: 0,
      repairLabourCents: 0,
      productCents: 0,
      consumablesCents: 0,
      boughtInCents: 0,
      feeCents: 0,
    };
    const bridge = bridgeOf(nothing, { ...nothing, priceCents: 0 });
    for (const value of Object.values(bridge)) expect(Object.is(value, 0)).toBe(true);
  });
});

describe('largestStep', () => {
  const flat = {
    priceCents: 0,
    plannedLabourCents: 0,
    rotLabourCents: 0,
    productCents: 0,
    consumablesCents: 0,
    feeCents: 0,
  };

  it('given steps of both signs, takes the one farthest from 0', () => {
    expect(largestStep({ ...flat, priceCents: 90, rotLabourCents: -100 })).toEqual({
      step: 'rotLabour',
      cents: -100,
    });
  });

  it('given equals, takes the one told first; given none, nothing', () => {
    expect(largestStep({ ...flat, feeCents: 5, productCents: -5 })?.step).toBe('product');
    expect(largestStep(flat)).toBeUndefined();
  });
});
