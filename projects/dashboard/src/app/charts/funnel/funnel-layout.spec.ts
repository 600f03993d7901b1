import { widestText } from '../text-width';
import type { FunnelInput, FunnelPoint } from './funnel-input';
import { layOutFunnel } from './funnel-layout';

const tick = (apart: number): string => String(apart);

function point(key: string, more: Partial<FunnelPoint> = {}): FunnelPoint {
  return {
    key,
    name: `Branch ${key}`,
    cars: 200,
    apart: 0,
    lower95: -0.03,
    upper95: 0.03,
    lower998: -0.05,
    upper998: 0.05,
    stand: 'inside',
    lines: [key],
    ...more,
  };
}

function input(points: readonly FunnelPoint[]): FunnelInput {
  return { summary: '', points, tick };
}

/** A small generator with a seed, so that a failure can be run again. */
function drawn(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 1664525 + 1013904223) % 4294967296;
    return state / 4294967296;
  };
}

function manyBranches(seed: number): FunnelPoint[] {
  const random = drawn(seed);
  return Array.from({ length: 24 }, (_, index) => {
    const half = 0.02 + random() * 0.03;
    const apart = (random() - 0.5) * 0.25;
    const stand = apart > half ? 'above' : apart < -half ? 'below' : 'inside';
    return point(`B${String(index).padStart(2, '0')}`, {
      // Some branches have as many cars as another.
      cars: 100 + Math.floor(random() * 12) * 40,
      apart,
      lower95: -half,
      upper95: half,
      lower998: -1.6 * half,
      upper998: 1.6 * half,
      stand,
    });
  });
}

describe('layOutFunnel', () => {
  it('random branches, some of as many cars: one is drawn outside its own limits if and only if it stands outside', () => {
    for (let seed = 1; seed <= 40; seed += 1) {
      for (const width of [312, 700, 1176]) {
        for (const branch of layOutFunnel(input(manyBranches(seed)), width).branches) {
          const drawnAs =
            branch.y < branch.upper95 ? 'above' : branch.y > branch.lower95 ? 'below' : 'inside';
          expect(drawnAs).toBe(branch.stand);
        }
      }
    }
  });

  it('branches of as many cars: each has a place of its own on the limits', () => {
    const { branches, limits95 } = layOutFunnel(
      input([point('A', { upper95: 0.02 }), point('B', { upper95: 0.04 })]),
      700,
    );
    expect(branches[1]!.x).toBeGreaterThan(branches[0]!.x);
    expect(limits95[0]!.split('L')).toHaveLength(4);
  });

  it('a crowd: names lie on no other name and those outside all have one', () => {
    for (let seed = 1; seed <= 20; seed += 1) {
      const points = manyBranches(seed);
      const { names } = layOutFunnel(input(points), 1176);
      const outside = points.filter(({ stand }) => stand !== 'inside');
      expect(names.filter(({ must }) => must)).toHaveLength(outside.length);
      for (const one of names) {
        for (const other of names) {
          const sameLine = one !== other && Math.abs(one.y - other.y) < 14;
          if (sameLine && one.anchor === other.anchor) {
            expect(Math.abs(one.x - other.x)).toBeGreaterThan(40);
          }
        }
      }
    }
  });

  it('limits far wider than any branch is apart: the branches keep more than half of the height', () => {
    const { branches, top, bottom } = layOutFunnel(
      input([
        point('A', { apart: 0.1, lower998: -9, upper998: 9 }),
        point('B', { apart: -0.1, cars: 300 }),
      ]),
      700,
    );
    const between = Math.abs(branches[0]!.y - branches[1]!.y);
    expect(between).toBeGreaterThan((bottom - top) / 2);
    expect(branches[0]!.upper998).toBe(top);
  });

  it.each([296, 1000])(
    'thousands of cars, %d px wide: counts stand clear of each other',
    (width) => {
      const many = [1400, 1900, 2300, 2600, 3100].map((cars) => point(`B${cars}`, { cars }));
      const { cars } = layOutFunnel(input(many), width);
      expect(cars.length).toBeGreaterThan(1);
      const ends = cars.map(({ x, text }) => ({ x, half: widestText([text]) / 2 }));
      ends.slice(1).forEach(({ x, half }, before) => {
        expect(x - half).toBeGreaterThan(ends[before]!.x + ends[before]!.half);
      });
    },
  );

  it('one branch: stands in the middle of its own limits', () => {
    const { branches, left, right, top, bottom, labels } = layOutFunnel(
      input([point('A', { apart: -0.02 })]),
      700,
    );
    expect(branches[0]!.x).toBeGreaterThan(left + (right - left) / 4);
    expect(branches[0]!.x).toBeLessThan(right - (right - left) / 4);
    expect(labels).toHaveLength(5);
    // Its limits are drawn whole, whatever side it lies on.
    expect(branches[0]!.upper998).toBeGreaterThan(top);
    expect(branches[0]!.lower998).toBeLessThan(bottom);
  });

  it('no branch: draws axes and nothing else', () => {
    const { branches, wash, names } = layOutFunnel(input([]), 700);
    expect([branches.length, wash, names.length]).toEqual([0, '', 0]);
  });
});
