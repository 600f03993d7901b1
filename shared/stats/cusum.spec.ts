import fc from 'fast-check';
import { tabularCusum } from './cusum';

const values = fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { maxLength: 40 });

describe('tabularCusum', () => {
  it('given a sum that just reaches h, is no signal; a hair beyond, is one', () => {
    const plan = { target: 0, k: 1, h: 4 };
    expect(tabularCusum([3, 3], plan).signals).toEqual([]);
    expect(tabularCusum([3, 3.5], plan).signals).toEqual([1]);
    expect(tabularCusum([-3, -3.5], plan).signals).toEqual([1]);
  });

  it('given points on target, works a sum off by k each, to nothing', () => {
    const { high } = tabularCusum([5, 0, 0, 0, 0], { target: 0, k: 2, h: 9 });
    expect(high).toEqual([3, 1, 0, 0, 0]);
  });

  it('given nothing, answers nothing', () => {
    expect(tabularCusum([], { target: 1, k: 1, h: 1 })).toEqual({ high: [], low: [], signals: [] });
  });

  it('given any values, is the largest sum of a stretch that ends there, and mirrors with its sides', () => {
    fc.assert(
      fc.property(values, (list) => {
        const plan = { target: 2, k: 0.5, h: 6 };
        const chart = tabularCusum(list, plan);
        list.forEach((_, end) => {
          let best = 0;
          let sum = 0;
          for (let from = end; from >= 0; from -= 1) {
            sum += list[from]! - plan.target - plan.k;
            best = Math.max(best, sum);
          }
          expect(chart.high[end]).toBeCloseTo(best, 8);
        });
        const mirrored = tabularCusum(
          list.map((value) => 2 * plan.target - value),
          plan,
        );
        mirrored.high.forEach((sum, at) => expect(sum).toBeCloseTo(chart.low[at]!, 8));
      }),
    );
  });
});
