import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { branchNeed, type BranchOutlook } from './branch-need';
import { useACar, type UseACar } from './use-a-car';
import { usualCars } from './usual-cars';

const P = 7;
const use = (mean: number, variance: number, cars?: number): ReadonlyMap<number, UseACar> =>
  new Map([[P, { mean, variance, cars }]]);
const outlook = (over: Partial<BranchOutlook>): BranchOutlook => ({
  ...{ bookedByWeek: [0, 0], open: [true, true], usual: undefined, kinds: [] },
  ...over,
});

describe('branchNeed', () => {
  it('given a full week and an empty one, adds diary and stand-ins with every error behind them', () => {
    const need = branchNeed(
      outlook({
        bookedByWeek: [3, 0],
        usual: { mean: 2, variance: 1, weeks: 4 },
        kinds: [
          { past: 6, booked: 3, use: use(100, 400, 6) },
          { past: 2, booked: 0, use: use(200, 0) },
        ],
      }),
    );
    expect(need.standIns).toEqual([0, 2]);
    expect(need.carsWithoutUse).toBe(0);
    // Two stand-ins of 125 ml each (variance 300 within kinds, 1875 between) and three booked cars of 100.
    const standIns = 2 * 2175 + (1 + 1 / 4) * 125 ** 2;
    const ofUse = (4.5 ** 2 * 400) / 6;
    const ofMix = (2 ** 2 * 1875) / 8;
    expect(need.products.get(P)?.mean).toBeCloseTo(550, 9);
    expect(need.products.get(P)?.variance).toBeCloseTo(1200 + standIns + ofUse + ofMix, 9);
  });

  it('given diaries fuller than usual, adds no stand-in and takes none away', () => {
    const need = branchNeed(
      outlook({
        bookedByWeek: [5, 5],
        usual: { mean: 2, variance: 9, weeks: 10 },
        kinds: [{ past: 20, booked: 10, use: use(100, 0, 20) }],
      }),
    );
    expect(need.standIns).toEqual([0, 0]);
    expect(need.products.get(P)).toEqual({ mean: 1000, variance: 0 });
  });

  it('given a branch that has closed, expects only what is in its diary', () => {
    const need = branchNeed(
      outlook({
        bookedByWeek: [1, 0],
        open: [true, false],
        usual: { mean: 1, variance: 0, weeks: 9 },
        kinds: [{ past: 9, booked: 1, use: use(100, 0, 9) }],
      }),
    );
    expect(need.standIns).toEqual([0, 0]);
    expect(need.products.get(P)?.mean).toBe(100);
  });

  it('given cars that nothing tells the use of, leaves them out and counts them', () => {
    const need = branchNeed(
      outlook({
        bookedByWeek: [1, 0],
        usual: { mean: 4, variance: 4, weeks: 9 },
        kinds: [
          { past: 30, booked: 0, use: use(100, 0, 30) },
          { past: 10, booked: 1, use: undefined },
        ],
      }),
    );
    // Seven stand-ins, a quarter of them of the unknown kind, and the booked one.
    expect(need.carsWithoutUse).toBeCloseTo(7 / 4 + 1, 12);
    expect(need.products.get(P)?.mean).toBeCloseTo(7 * 0.75 * 100, 9);
  });

  it('given years that were drawn, its range holds what comes about 95 times of 100', () => {
    const generator = xoroshiro128plus(11);
    const uniform = () => (generator.next() >>> 0) / 2 ** 32;
    const number = (mean: number) => {
      let product = uniform();
      let count = 0;
      for (; product > Math.exp(-mean); count += 1) product *= uniform();
      return count;
    };
    const car = () => (uniform() < 0.7 ? 3000 + 2000 * uniform() : 8000 + 1000 * uniform());
    let held = 0;
    const rounds = 1500;
    for (let round = 0; round < rounds; round += 1) {
      const weekly = Array.from({ length: 20 }, () => number(3));
      const kinds = [0, 1].map(() => ({ cars: 0, sum: 0, squares: 0 }));
      for (let n = weekly.reduce((all, one) => all + one, 0); n > 0; n -= 1) {
        const ml = car();
        const kind = kinds[ml < 6000 ? 0 : 1]!;
        kind.cars += 1;
        kind.sum += ml;
        kind.squares += ml * ml;
      }
      const cells = kinds.map((kind, packageId) => ({
        ...{ branchId: 1, bodyType: 'van' as const, productId: P },
        ...{ packageId, ...kind },
      }));
      const find = useACar(cells, cells, []);
      const need = branchNeed({
        bookedByWeek: Array<number>(8).fill(0),
        open: Array<boolean>(8).fill(true),
        usual: usualCars(weekly),
        kinds: cells.map((cell) => ({ past: cell.cars, booked: 0, use: find(cell) })),
      });
      let came = 0;
      for (let week = 0; week < 8; week += 1) {
        for (let n = number(3); n > 0; n -= 1) came += car();
      }
      const { mean, variance } = need.products.get(P)!;
      if (Math.abs(came - mean) <= 1.959964 * Math.sqrt(variance)) held += 1;
    }
    expect(held / rounds).toBeGreaterThan(0.93);
    expect(held / rounds).toBeLessThan(0.97);
  }, 20_000);
});

describe('useACar', () => {
  const cell = { branchId: 1, packageId: 1, bodyType: 'van' as const };
  const norms = [{ packageId: 1, bodyType: 'van' as const, productId: P, ml: 4000 }];

  it('given five own cars, takes their mean and spread, a car that lists nothing at 0', () => {
    // 100, 100, 200, 0, 0: mean 80, Σ(x − 80)² = 28,000.
    const sums = [{ ...cell, productId: P, sum: 400, squares: 60_000 }];
    const found = useACar([{ ...cell, cars: 5 }], sums, norms)(cell);
    expect(found?.get(P)).toEqual({ mean: 80, variance: 7000, cars: 5 });
  });

  it('given fewer, takes the norm with the spread within the branches of the scope', () => {
    const other = { ...cell, branchId: 2 };
    const cells = [
      { ...cell, cars: 2 },
      { ...other, cars: 3 },
    ];
    // 10 and 30 there, 100, 100 and 160 here: (200 + 2400) / (1 + 2).
    const sums = [
      { ...cell, productId: P, sum: 40, squares: 1000 },
      { ...other, productId: P, sum: 360, squares: 45_600 },
    ];
    const found = useACar(cells, sums, norms)(cell)?.get(P);
    expect(found).toMatchObject({ mean: 4000, cars: undefined });
    expect(found?.variance).toBeCloseTo(2600 / 3, 9);
    expect(useACar([], [], norms)(cell)?.get(P)).toEqual({ mean: 4000, variance: 0 });
  });

  it('given neither, tells nothing', () => {
    expect(useACar([{ ...cell, cars: 4 }], [], [])(cell)).toBeUndefined();
  });
});

describe('usualCars', () => {
  it('given weeks, tells mean and spread; given one, a Poisson number’s; given none, nothing', () => {
    expect(usualCars([1, 2, 3])).toEqual({ mean: 2, variance: 1, weeks: 3 });
    expect(usualCars([4])).toEqual({ mean: 4, variance: 4, weeks: 1 });
    expect(usualCars([])).toBeUndefined();
  });
});
