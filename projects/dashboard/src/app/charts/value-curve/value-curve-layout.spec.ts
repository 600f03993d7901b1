import { layOutValueCurve } from './value-curve-layout';

const input = {
  summary: 'The price rises with the margin.',
  points: [0, 0.1, 0.2, 0.3].map((x) => ({ x, y: 500 / (0.94 - x) })),
  chosen: { x: 0.25, y: 500 / 0.69, text: '€725 keeps 25 %' },
  xText: (x: number) => `${Math.round(x * 100)} %`,
  yText: (y: number) => `€${y}`,
};

describe('layOutValueCurve', () => {
  it('a rising curve: runs right and up inside the picture', () => {
    const { dots, left, right, bottom } = layOutValueCurve(input, 400);
    for (const [before, after] of dots.slice(1).map((dot, index) => [dots[index]!, dot] as const)) {
      expect(after.x).toBeGreaterThan(before.x);
      expect(after.y).toBeLessThan(before.y);
    }
    expect(dots[0]!.x).toBe(left);
    expect(dots.at(-1)!.x).toBe(right);
    expect(dots[0]!.y).toBeLessThanOrEqual(bottom);
  });

  it('the chosen point: lies on the curve between its neighbours, its words inside the picture', () => {
    const { chosen, dots } = layOutValueCurve(input, 400);
    expect(chosen!.x).toBeGreaterThan(dots[2]!.x);
    expect(chosen!.x).toBeLessThan(dots[3]!.x);
    expect(chosen!.wordX).toBeLessThanOrEqual(400);
    expect(chosen!.wordY).toBeGreaterThan(0);
  });

  it('a point at the left end: its words move right of the axis', () => {
    const chosen = { ...input.points[0]!, text: '€532 keeps nothing at all' };
    const { chosen: placed, left } = layOutValueCurve({ ...input, chosen }, 400);
    expect(placed!.wordX).toBeGreaterThan(left + 100);
  });
});
