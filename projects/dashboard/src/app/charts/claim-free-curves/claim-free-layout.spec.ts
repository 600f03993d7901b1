import type { ClaimFreeCurve, ClaimFreeInput } from './claim-free-input';
import { layOutClaimFree } from './claim-free-layout';

function curve(key: string, last: number, months = 36, told = months): ClaimFreeCurve {
  return {
    key,
    label: key,
    cars: 1000,
    months: Array.from({ length: months }, (_, index) => {
      const share = 1 - ((1 - last) * (index + 1)) / months;
      const known = index < told;
      return {
        month: index + 1,
        atRisk: 1000 - 20 * (index + 1),
        share: known ? share : null,
        lower: known ? share - 0.01 : null,
        upper: known ? Math.min(1, share + 0.005) : null,
      };
    }),
  };
}

const input = (...curves: ClaimFreeCurve[]): ClaimFreeInput => ({
  summary: 'Most cars have no claim.',
  curves,
  shareText: (share) => `${Math.round(share * 100)} %`,
  countText: String,
});

describe('layOutClaimFree', () => {
  it('curves of different ends: each begins at all cars and falls; their words keep a line apart', () => {
    const { curves, left } = layOutClaimFree(
      input(curve('full', 0.97), curve('cavity', 0.968)),
      660,
    );
    for (const { line } of curves)
      expect(line).toMatch(new RegExp(`^M${Math.round(left * 10) / 10} 12H`));
    expect(Math.abs(curves[0]!.labelY - curves[1]!.labelY)).toBeGreaterThanOrEqual(20);
    expect(curves.map(({ share }) => share)).toEqual(['97 %', '97 %']);
    expect(curves[0]!.way).not.toBe(curves[1]!.way);
  });

  it('cars at risk: stand under the ticks of the axis, at 0 all cars, then those of that month', () => {
    const { curves, xTicks } = layOutClaimFree(input(curve('full', 0.97)), 660);
    expect(xTicks.map(({ text }) => text)).toEqual(['0', '6', '12', '18', '24', '30', '36']);
    const [row] = curves;
    expect(row!.counts.map(({ x }) => x)).toEqual(xTicks.map(({ x }) => x));
    expect(row!.counts.map(({ text }) => text).slice(0, 3)).toEqual(['1000', '880', '760']);
  });

  it('too few at risk from month 12 on: the curve ends there, not the axis', () => {
    const { curves, right } = layOutClaimFree(
      input(curve('full', 0.97), curve('cavity', 0.97, 36, 12)),
      660,
    );
    expect(curves[0]!.endX).toBeCloseTo(right);
    expect(curves[1]!.endX).toBeLessThan(right - 100);
  });

  it('a phone: fewer ticks, names over the cars at risk, only shares at the ends', () => {
    const wide = layOutClaimFree(input(curve('underbody', 0.97)), 660);
    const phone = layOutClaimFree(input(curve('underbody', 0.97)), 296);
    expect(phone.stacked).toBe(true);
    expect(phone.xTicks.length).toBeLessThan(wide.xTicks.length);
    expect(phone.right - phone.left).toBeGreaterThan(200);
    expect(phone.curves[0]!.countsY).toBeGreaterThan(phone.curves[0]!.nameY);
    expect(phone.height).toBeGreaterThan(wide.height);
  });

  it('no group: a picture without curves', () => {
    expect(layOutClaimFree(input(), 660).curves).toEqual([]);
  });
});
