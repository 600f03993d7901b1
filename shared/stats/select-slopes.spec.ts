import fc from 'fast-check';
import { selectSlopes } from './select-slopes';
import { slopeCount, slopeGroups } from './slope-groups';

/** Every pair's slope, sorted: the definition itself. */
function allSlopes(times: readonly number[], values: readonly number[]): Float64Array {
  const slopes: number[] = [];
  times.forEach((time, later) => {
    for (let earlier = 0; earlier < later; earlier += 1) {
      const run = time - (times[earlier] as number);
      const rise = (values[later] as number) - (values[earlier] as number);
      if (run !== 0) slopes.push(rise / run + 0);
    }
  });
  return new Float64Array(slopes).sort();
}

function expectEveryRank(points: readonly (readonly [number, number])[], few: number): void {
  const times = points.map(([time]) => time);
  const values = points.map(([, value]) => value);
  const slopes = allSlopes(times, values);
  const groups = slopeGroups(times, values);
  expect(slopeCount(groups)).toBe(slopes.length);
  const step = Math.max(1, Math.floor(slopes.length / 7));
  for (let rank = 0; rank + 1 < slopes.length; rank += step) {
    expect(selectSlopes(groups, [rank, rank + 1], few)).toEqual([slopes[rank], slopes[rank + 1]]);
  }
  const ranks = Array.from(slopes.keys()).filter((rank) => rank % step === 0);
  expect(selectSlopes(groups, ranks, few)).toEqual(ranks.map((rank) => slopes[rank]));
}

const tied = fc.tuple(fc.integer({ min: -5, max: 5 }), fc.integer({ min: 0, max: 6 }));
const loose = fc.tuple(
  fc.double({ min: -40, max: 60, noNaN: true }),
  fc.double({ min: -1e4, max: 1e4, noNaN: true }),
);
const twoValues = fc.tuple(fc.integer({ min: 0, max: 2 }), fc.constantFrom(0, 1));

describe('selectSlopes', () => {
  it.each([
    ['whole numbers with many ties', tied],
    ['numbers of any digits', loose],
    ['three times and two values', twoValues],
  ])('given %s, finds the same as writing all pairs out', (_circumstance, point) => {
    fc.assert(
      fc.property(
        fc.array<readonly [number, number]>(point, { minLength: 2, maxLength: 60 }),
        fc.constantFrom(1, 20, 2 ** 20),
        expectEveryRank,
      ),
    );
  });

  it('given times so near that slopes are infinite, still ends and orders them', () => {
    const points: [number, number][] = [
      [0, 1],
      [5e-324, 100],
      [1e-323, 5],
      [2, 8],
      [3, -7],
    ];
    expectEveryRank(points, 1);
  });

  it('given more pairs than are written out, finds the same as writing all of them out', () => {
    // Whole numbers in a fixed disorder: 2,000 points at 41 times, two million pairs, with a slope of about −3.
    const points = Array.from({ length: 2000 }, (_, index): [number, number] => {
      const time = (index * 7) % 41;
      return [time, 500 - 3 * time + ((index * 7919) % 101)];
    });
    expectEveryRank(points, 2 ** 20);
  });
});
