import fc from 'fast-check';
import { kaplanMeier } from './kaplan-meier';
import type { RiskStep } from './risk-step';

/** Cars leaving month by month, with the event or without. */
const histories = fc
  .tuple(
    fc.integer({ min: 1, max: 500 }),
    fc.array(fc.tuple(fc.nat({ max: 30 }), fc.nat({ max: 30 })), { maxLength: 30 }),
  )
  .map(([start, leavings]) => {
    const steps: RiskStep[] = [];
    let atRisk = start;
    for (const [first, second] of leavings) {
      const events = Math.min(first, atRisk);
      steps.push({ atRisk, events });
      atRisk -= events + Math.min(second, atRisk - events);
    }
    return steps;
  });

describe('kaplanMeier', () => {
  it('given no step, is empty', () => {
    expect(kaplanMeier([])).toEqual([]);
  });

  it('given no event yet, is 1 without limits', () => {
    expect(kaplanMeier([{ atRisk: 9, events: 0 }])).toEqual([{ survival: 1, standardError: 0 }]);
  });

  it('given the event of everybody left, is 0 without spread, then and after', () => {
    const steps = [
      { atRisk: 3, events: 3 },
      { atRisk: 0, events: 0 },
    ];
    expect(kaplanMeier(steps)).toEqual([{ survival: 0 }, { survival: 0 }]);
  });

  it('given nobody leaving without the event, is the plain share with its binomial error', () => {
    const [, second] = kaplanMeier([
      { atRisk: 20, events: 3 },
      { atRisk: 17, events: 2 },
    ]);
    expect(second?.survival).toBeCloseTo(15 / 20, 14);
    expect(second?.standardError).toBeCloseTo(Math.sqrt((0.75 * 0.25) / 20), 14);
  });

  it('given any history, never rises and lies inside its limits', () => {
    fc.assert(
      fc.property(histories, (steps) => {
        let before = 1;
        for (const { survival, lower, upper } of kaplanMeier(steps)) {
          expect(survival).toBeLessThanOrEqual(before);
          if (lower !== undefined && upper !== undefined) {
            expect(lower).toBeGreaterThanOrEqual(0);
            expect(lower).toBeLessThanOrEqual(survival);
            expect(upper).toBeGreaterThanOrEqual(survival);
            expect(upper).toBeLessThanOrEqual(1);
          }
          before = survival;
        }
      }),
    );
  });

  it('given steps without an event between, is not changed by them', () => {
    fc.assert(
      fc.property(histories, (steps) => {
        const quiet = steps.flatMap((step) => [{ atRisk: step.atRisk, events: 0 }, step]);
        const kept = kaplanMeier(quiet).filter((_step, index) => index % 2 === 1);
        expect(kept).toEqual(kaplanMeier(steps));
      }),
    );
  });

  it.each([
    [3, 4],
    [3, -1],
    [2.5, 1],
    [Number.NaN, 0],
  ])('given %d at risk and %d events, throws', (atRisk, events) => {
    expect(() => kaplanMeier([{ atRisk, events }])).toThrow(RangeError);
  });
});
