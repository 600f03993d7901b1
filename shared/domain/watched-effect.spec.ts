import { funnelReference, type FunnelCell } from './funnel';
import { watchedEffect } from './watched-effect';
import type { BranchMeasure } from './vocabulary';

/** A cell of cars, each with what is measured (a) by what (e). */
function cell(key: number, cars: readonly (readonly [a: number, e: number])[]): FunnelCell {
  const sum = (of: (a: number, e: number) => number): number =>
    cars.reduce((all, [a, e]) => all + of(a, e), 0);
  return {
    key,
    cars: cars.length,
    e: sum((_, e) => e),
    parts: [sum((a) => a)],
    aa: sum((a) => a * a),
    ae: sum((a, e) => a * e),
    ee: sum((_, e) => e * e),
  };
}

const times = <T>(n: number, make: (at: number) => T): T[] =>
  Array.from({ length: n }, (_, at) => make(at));

/** Car-years of a cell with its claims: cover has no squares. */
const covered = (key: number, cars: number, e: number, claims: number): FunnelCell => {
  return { key, cars, e, parts: [claims], aa: 0, ae: 0, ee: 0 };
};

/** Uniform numbers that are the same every run (a linear congruential generator, constants of Numerical Recipes). */
function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(1664525, state) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

describe('watchedEffect', () => {
  it('given overruns worked out by hand, is their distances from expected, with the ratio estimator', () => {
    const before = [cell(1, [...times(4, () => [12, 10] as const), [22, 10]])];
    const after = [cell(1, [...times(4, () => [10, 10] as const), [20, 10]])];
    // Together 130 minutes for 100 estimated: 1.3.
    const effect = watchedEffect(funnelReference('overrun', [...before, ...after]), before, after);
    expect(effect.before).toMatchObject({ cars: 5, expected: expect.closeTo(1.3, 12) });
    // 70/50, residuals −2 four times and 8: Σ² = 80, s.e. = √(80/20)/10 = 0.2.
    expect(effect.before.value?.value).toBeCloseTo(1.4, 12);
    expect(effect.before.value?.lower).toBeCloseTo(1.4 - 1.959964 * 0.2, 12);
    expect(effect.after.value?.value).toBeCloseTo(1.2, 12);
    // Both sides have the same spread: s.e. of the difference = 0.2·√2.
    expect(effect.change?.value).toBeCloseTo(-0.2, 12);
    expect(effect.change?.upper).toBeCloseTo(-0.2 + 1.959964 * 0.2 * Math.SQRT2, 12);
    expect(effect.change?.lower).toBeCloseTo(-0.2 - 1.959964 * 0.2 * Math.SQRT2, 12);
  });

  it('given rot, is the hybrid score interval of the two shares about what is expected', () => {
    // Newcombe (1998), table II, case (a): 56/70 − 48/80 is 0.0524 to 0.3339; quoted from memory.
    const some = (yes: number, all: number): FunnelCell[] => [
      cell(
        1,
        times(all, (at) => [at < yes ? 1 : 0, 1] as const),
      ),
    ];
    const [before, after] = [some(48, 80), some(56, 70)];
    const effect = watchedEffect(funnelReference('rot', [...before, ...after]), before, after);
    expect(effect.change?.value).toBeCloseTo(0.2, 12);
    expect(effect.change?.lower).toBeCloseTo(0.0524, 4);
    expect(effect.change?.upper).toBeCloseTo(0.3339, 4);
  });

  it('given claims, is exact about each side: ten in 2 thousand car-years, none in one', () => {
    const [before, after] = [[covered(1, 900, 2, 10)], [covered(1, 900, 1, 0)]];
    const effect = watchedEffect(funnelReference('claims', [...before, ...after]), before, after);
    // Garwood (1936): 10 events are 4.795 to 18.39, none 0 to 3.689.
    expect(effect.before.value?.lower).toBeCloseTo(4.795 / 2, 3);
    expect(effect.before.value?.upper).toBeCloseTo(18.39 / 2, 2);
    expect(effect.after.value).toMatchObject({ value: 0, lower: 0 });
    expect(effect.after.value?.upper).toBeCloseTo(3.689, 3);
    expect(effect.change?.value).toBeCloseTo(-5, 12);
  });

  it.each(['overrun', 'product', 'margin', 'rot', 'claims'] as const)(
    'given %s the same on both sides, has no change and as much room above as below',
    (measure: BranchMeasure) => {
      const side = [
        cell(
          1,
          times(9, (at) => [at % 3 === 0 ? 1 : 0, 1] as const),
        ),
        cell(
          2,
          times(7, (at) => [at % 2, 1] as const),
        ),
      ];
      const effect = watchedEffect(funnelReference(measure, [...side, ...side]), side, side);
      expect(effect.change?.value).toBe(0);
      expect(effect.change?.upper).toBeCloseTo(-(effect.change?.lower ?? NaN), 12);
      expect(effect.change?.upper).toBeGreaterThan(0);
    },
  );

  it('given other cars of the same rates, has no change: the mix is no effect', () => {
    const light = (n: number) =>
      cell(
        1,
        times(n, () => [10, 10] as const),
      );
    const heavy = (n: number) =>
      cell(
        2,
        times(n, () => [30, 10] as const),
      );
    const [before, after] = [
      [light(20), heavy(5)],
      [light(5), heavy(20)],
    ];
    const effect = watchedEffect(funnelReference('overrun', [...before, ...after]), before, after);
    expect(effect.after.value?.value).toBeCloseTo(2.6, 12);
    expect(effect.change?.value).toBeCloseTo(0, 12);
  });

  it('given four cars on a side, tells nothing of it and no change, of no measure (rule 13)', () => {
    const all = [
      cell(
        1,
        times(9, (at) => [at, 10] as const),
      ),
    ];
    const few = [
      cell(
        1,
        times(4, (at) => [at, 10] as const),
      ),
    ];
    for (const measure of ['overrun', 'rot', 'claims', 'product', 'margin'] as const) {
      const effect = watchedEffect(funnelReference(measure, all), all, few);
      expect(effect.after).toEqual({ cars: 4, value: undefined, expected: undefined });
      expect(effect.change).toBeUndefined();
      expect(watchedEffect(funnelReference(measure, all), [], all).change).toBeUndefined();
    }
  });
});

describe('watchedEffect, given thousands of branches where nothing changed', () => {
  const RUNS = 4000;

  /** Share of runs in which the interval of the change holds zero; the reference is large and known. */
  function coverage(measure: BranchMeasure, rates: readonly number[], side: () => FunnelCell[]) {
    const exact = funnelReference(
      measure,
      rates.map((rate, key) => cell(key, [[rate, 1]])),
    );
    let covered = 0;
    for (let run = 0; run < RUNS; run += 1) {
      const { change } = watchedEffect(exact, side(), side());
      if (change && change.lower <= 0 && change.upper >= 0) covered += 1;
    }
    return covered / RUNS;
  }

  it('of overruns of 40 cars on a side, covers it about 95 times in a hundred', () => {
    const random = seeded(6);
    const side = () =>
      [1.1, 1.5].map((rate, key) =>
        cell(
          key,
          times(20, () => {
            const e = 300 + 300 * random();
            // Right-skewed, as overruns are; mean 1.
            return [e * rate * (0.6 - 0.4 * Math.log(1 - random())), e] as const;
          }),
        ),
      );
    const share = coverage('overrun', [1.1, 1.5], side);
    expect(share).toBeGreaterThan(0.93);
    expect(share).toBeLessThan(0.965);
  });

  it('of rot of 60 cars on a side, covers it at least about 95 times in a hundred', () => {
    const random = seeded(7);
    const side = () =>
      [0.25, 0.6].map((rate, key) =>
        cell(
          key,
          times(30, () => [random() < rate ? 1 : 0, 1] as const),
        ),
      );
    const share = coverage('rot', [0.25, 0.6], side);
    expect(share).toBeGreaterThan(0.94);
    expect(share).toBeLessThan(0.985);
  });

  it('of claims, ten expected on a side, covers it at least 95 times in a hundred: exact limits are wide', () => {
    const random = seeded(8);
    const poisson = (mean: number): number => {
      let [count, product] = [0, random()];
      for (const least = Math.exp(-mean); product > least; count += 1) product *= random();
      return count;
    };
    const share = coverage('claims', [10, 10], () => [covered(0, 400, 1, poisson(10))]);
    expect(share).toBeGreaterThan(0.95);
    expect(share).toBeLessThan(0.995);
  });
});
