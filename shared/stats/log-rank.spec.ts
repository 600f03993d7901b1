import fc from 'fast-check';
import { logRank } from './log-rank';
import type { RiskStep } from './risk-step';

const group = fc
  .tuple(fc.integer({ min: 20, max: 300 }), fc.array(fc.nat({ max: 5 }), { maxLength: 12 }))
  .map(([start, events]) => {
    let atRisk = start;
    return events.map((wanted): RiskStep => {
      const step = { atRisk, events: Math.min(wanted, atRisk) };
      atRisk -= step.events;
      return step;
    });
  });

describe('logRank', () => {
  it('given groups alike, finds nothing', () => {
    const steps = [
      { atRisk: 40, events: 2 },
      { atRisk: 38, events: 1 },
    ];
    const found = logRank([steps, steps, steps]);
    expect(found?.chiSquare).toBeCloseTo(0, 12);
    expect(found?.degreesOfFreedom).toBe(2);
    expect(found?.p).toBeCloseTo(1, 12);
  });

  it('given one step, is the hypergeometric statistic of its table', () => {
    // 30 at risk in two groups of 10 and 20, 6 events of which 4 in the first: expected 2, variance 6·(1/3)·(2/3)·24/29.
    const found = logRank([[{ atRisk: 10, events: 4 }], [{ atRisk: 20, events: 2 }]]);
    expect(found?.chiSquare).toBeCloseTo(4 / ((6 * 2 * 24) / (9 * 29)), 12);
    expect(found?.groups[0]).toEqual({ observed: 4, expected: 2 });
  });

  it.each([
    ['no group', []],
    ['one group', [[{ atRisk: 5, events: 1 }]]],
    ['no event', [[{ atRisk: 5, events: 0 }], [{ atRisk: 5, events: 0 }]]],
    [
      'groups never at risk together',
      [
        [{ atRisk: 5, events: 1 }],
        [
          { atRisk: 0, events: 0 },
          { atRisk: 5, events: 1 },
        ],
      ],
    ],
  ])('given %s, is undefined', (_circumstance, groups) => {
    expect(logRank(groups)).toBeUndefined();
  });

  it('given a group that nobody was ever at risk in, tests the others as without it', () => {
    const [first, second] = [[{ atRisk: 10, events: 4 }], [{ atRisk: 20, events: 2 }]];
    const found = logRank([first, [], second]);
    expect(found?.chiSquare).toBe(logRank([first, second])?.chiSquare);
    expect(found?.degreesOfFreedom).toBe(1);
    expect(found?.groups[1]).toEqual({ observed: 0, expected: 0 });
  });

  it('given any groups, expects as many events as were observed, in whatever order they come', () => {
    fc.assert(
      fc.property(fc.array(group, { minLength: 2, maxLength: 4 }), (groups) => {
        const found = logRank(groups);
        if (!found) return;
        const observed = found.groups.reduce((sum, one) => sum + one.observed, 0);
        const expected = found.groups.reduce((sum, one) => sum + one.expected, 0);
        expect(expected).toBeCloseTo(observed, 8);
        const turned = logRank([...groups].reverse());
        expect(turned?.chiSquare).toBeCloseTo(found.chiSquare, 7);
      }),
    );
  });

  it('given one car alone at risk in the end, leaves nothing to chance there', () => {
    const first = { atRisk: 10, events: 4 };
    const found = logRank([[first, { atRisk: 1, events: 1 }], [{ atRisk: 20, events: 2 }]]);
    expect(found?.chiSquare).toBe(logRank([[first], [{ atRisk: 20, events: 2 }]])?.chiSquare);
    expect(found?.groups[0]).toEqual({ observed: 5, expected: 3 });
  });

  it('given more events than were at risk, throws', () => {
    expect(() => logRank([[{ atRisk: 1, events: 2 }], [{ atRisk: 4, events: 1 }]])).toThrow(
      RangeError,
    );
  });
});
