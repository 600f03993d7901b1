import fc from 'fast-check';
import { a, aCar, cellsOf, drawnCar, rateBy, sum } from '../../test/support/funnel-cars';
import {
  funnelReference,
  placeInFunnel,
  squaresAbout,
  stepsOf,
  type FunnelCell,
  type FunnelPlace,
} from './funnel';
import { BRANCH_MEASURES } from './vocabulary';

const fleets = fc.array(drawnCar, { minLength: 1, maxLength: 60 });
const enough = fc.array(drawnCar, { minLength: 5, maxLength: 60 });
const NAMES = ['first', 'second'];

describe('placeInFunnel', () => {
  it('given single cars, places each branch as counting them one by one does', () => {
    fc.assert(
      fc.property(fleets, (cars) => {
        const reference = funnelReference('overrun', cellsOf(cars));
        const rates = new Map(cars.map(({ key }) => [key, rateBy(cars, key)]));
        const residuals = cars.map((one) => a(one) - rates.get(one.key)! * one.e);
        const spread = sum(residuals.map((left) => left * left)) / (cars.length - 1);
        if (cars.length > 1) expect(near(reference.variance!, spread, 1e-7)).toBe(true);
        expect(near(reference.value!, sum(cars.map(a)) / sum(cars.map(({ e }) => e)))).toBe(true);
        for (const branch of [0, 1, 2, 3]) {
          const own = cars.filter((one) => one.branch === branch);
          const place = placeInFunnel(cellsOf(own), reference);
          expect(place.cars).toBe(own.length);
          if (own.length < 5) {
            expect(place.flag).toBe('too_few');
            continue;
          }
          const e = sum(own.map((one) => one.e));
          const value = sum(own.map(a)) / e;
          const expected = sum(own.map((one) => rates.get(one.key)! * one.e)) / e;
          expect(near(place.value!, value)).toBe(true);
          expect(near(place.expected!, expected)).toBe(true);
          const reach = Math.sqrt(spread * own.length) / e;
          expect(near(place.limits!.upper95, expected + 1.959964 * reach, 1e-6)).toBe(true);
          expect(near(place.limits!.lower95, expected - 1.959964 * reach, 1e-6)).toBe(true);
          expect(near(place.limits!.upper998, expected + 3.090232 * reach, 1e-6)).toBe(true);
          expect(near(place.limits!.lower998, expected - 3.090232 * reach, 1e-6)).toBe(true);
        }
      }),
    );
  });

  it('given cells in another order or cut up, says the same', () => {
    fc.assert(
      fc.property(fleets, (cars) => {
        const whole = funnelReference('product', cellsOf(cars));
        const singles = cars.toReversed().flatMap((one) => cellsOf([one]));
        const cut = funnelReference('product', singles);
        const [one, other] = [placeInFunnel(cellsOf(cars), whole), placeInFunnel(singles, cut)];
        if (one.value === undefined) return;
        expect(near(one.value, other.value!)).toBe(true);
        expect(near(one.expected!, other.expected!)).toBe(true);
        if (!one.limits) return;
        expect(near(one.limits.upper998, other.limits!.upper998, 1e-6)).toBe(true);
      }),
    );
  });

  it('given all of the reference, is as expected, at its own value', () => {
    fc.assert(
      fc.property(enough, fc.constantFrom('overrun', 'product', 'margin'), (cars, measure) => {
        const reference = funnelReference(measure, cellsOf(cars));
        const place = placeInFunnel(cellsOf(cars), reference);
        expect(near(place.expected!, reference.value!)).toBe(true);
      }),
    );
  });

  it('given other cars than the reference has on the whole, expects what such cars have there', () => {
    const reference = funnelReference('rot', [...rot(1, 90, 9), ...rot(2, 10, 9)]);
    expect(reference.value).toBeCloseTo(0.18, 12);
    const old = placeInFunnel(rot(2, 30, 24), reference);
    expect([old.value, old.expected, old.flag]).toEqual([0.8, 0.9, 'as_expected']);
    const young = placeInFunnel(rot(1, 30, 24), reference);
    expect([young.value, young.expected, young.flag]).toEqual([0.8, 0.1, 'above_998']);
  });

  it('given a key that the reference has not, expects nothing of it', () => {
    const reference = funnelReference('rot', rot(1, 50, 10));
    expect(placeInFunnel([...rot(1, 10, 2), ...rot(9, 10, 0)], reference).expected).toBeCloseTo(
      0.1,
      12,
    );
  });

  it.each(BRANCH_MEASURES)('given four cars and the measure %s, is too few', (measure) => {
    const reference = funnelReference(measure, rot(1, 50, 10));
    const { value, expected, limits, flag } = placeInFunnel(rot(1, 4, 1), reference);
    const told = measure === 'margin' || measure === 'claims';
    expect([value, expected, limits, flag]).toEqual([
      told ? 0.25 : undefined,
      undefined,
      undefined,
      'too_few',
    ]);
    expect(placeInFunnel(rot(1, 5, 1), reference).expected).toBeCloseTo(0.2, 12);
  });

  it.each(BRANCH_MEASURES)(
    'given nothing to divide by and the measure %s, is too few',
    (measure) => {
      const nothing: FunnelCell = { key: 1, cars: 9, e: 0, parts: [3], aa: 9, ae: 0, ee: 0 };
      const reference = funnelReference(measure, [nothing]);
      const place = placeInFunnel([nothing], reference);
      expect(reference.value).toBeUndefined();
      expect([place.value, place.expected, place.limits, place.flag]).toEqual([
        undefined,
        undefined,
        undefined,
        'too_few',
      ]);
      expect(placeInFunnel([], reference).flag).toBe('too_few');
      expect(placeInFunnel([], funnelReference(measure, [])).flag).toBe('too_few');
    },
  );

  it('given claims where none are expected, has no funnel', () => {
    const reference = funnelReference('claims', claims(40, 3, 0));
    const place = placeInFunnel(claims(40, 3, 0), reference);
    expect([place.value, place.expected, place.limits, place.flag]).toEqual([
      0,
      0,
      undefined,
      'too_few',
    ]);
  });

  it('given claims, has the limits of their count over what it divides by', () => {
    const reference = funnelReference('claims', claims(4000, 10, 30));
    const { value, expected, limits } = placeInFunnel(claims(400, 1, 4), reference);
    expect([value, expected]).toEqual([4, 3]);
    // A mean of 3: F(0) = e⁻³ reaches .025, F(6) = .96649 and F(7) = .98810 hold .975 between them.
    const steps = [0, 1, 2, 3, 4, 5, 6, 7].map((count) => poisson(3, count));
    const upper = 7 - (sum(steps) - 0.975) / steps[7]!;
    expect(limits!.upper95).toBeCloseTo(upper, 10);
    expect(limits!.lower998).toBe(0);
    const thrice = placeInFunnel(claims(400, 3, 9), reference);
    expect(thrice.expected).toBe(3);
    expect(thrice.limits!.upper95).toBeLessThan(upper);
  });

  it('given a value just on a limit, is within it; a hair beyond, is not', () => {
    const rates = new Map([[1, [1]]]);
    const fixed = {
      measure: 'overrun',
      cars: 100,
      value: 1,
      rates,
      variance: 1,
      parts: 1,
    } as const;
    for (const [z, within, beyond] of [
      [1.959964, 'as_expected', 'above_95'],
      [3.090232, 'above_95', 'above_998'],
      [-1.959964, 'as_expected', 'below_95'],
      [-3.090232, 'below_95', 'below_998'],
    ] as const) {
      // 25 cars with e 1 each: limits are 1 ± z/5.
      const at = (value: number): FunnelPlace =>
        placeInFunnel(
          [{ key: 1, cars: 25, e: 25, parts: [25 * value], aa: 0, ae: 0, ee: 25 }],
          fixed,
        );
      expect(at(1 + z * 0.2 * (1 - 1e-9)).flag).toBe(within);
      expect(at(1 + z * 0.2 * (1 + 1e-9)).flag).toBe(beyond);
    }
  });

  it('given cars that all take what is estimated, has no spread and nobody outside, however parts round', () => {
    fc.assert(
      fc.property(fleets, (cars) => {
        const exact = cars.map((one) => ({ ...one, e: Math.max(1, a(one)) }));
        const all = cellsOf(exact.filter((one) => a(one) === one.e));
        const reference = funnelReference('overrun', all);
        if (reference.variance !== undefined) expect(reference.variance).toBeLessThan(1e-9);
        const place = placeInFunnel(all, { ...reference, variance: 0 });
        expect(place.flag).toBe(place.cars < 5 ? 'too_few' : 'as_expected');
      }),
    );
  });

  it('given all cars with rot, in bands that do not divide evenly, is within limits that are all', () => {
    const bands = [3, 1, 2, 1, 3, 7].map((cars, band) => ({
      ...rot(band, cars, cars)[0]!,
      parts: [0, 1, 2, 3, 4, 5].map((part) => (part === band ? cars : 0)),
    }));
    const place = placeInFunnel(bands, funnelReference('rot', bands));
    expect([place.value, place.flag]).toEqual([1, 'as_expected']);
  });

  it('given a single car, knows no spread', () => {
    expect(funnelReference('margin', cellsOf([aCar()])).variance).toBeUndefined();
  });
});

describe('stepsOf', () => {
  it('given any cars, leads from the reference to the branch, the mix first', () => {
    fc.assert(
      fc.property(fleets, (cars) => {
        const reference = funnelReference('overrun', cellsOf(cars));
        for (const branch of [0, 1, 2, 3]) {
          const own = cars.filter((one) => one.branch === branch);
          const place = placeInFunnel(cellsOf(own), reference);
          const steps = stepsOf(place, reference, NAMES);
          if (own.length < 5) {
            expect(steps).toBeUndefined();
            continue;
          }
          expect(steps!.map(({ key }) => key)).toEqual(['mix', ...NAMES]);
          expect(steps![0]!.value).toBeCloseTo(place.expected! - reference.value!, 12);
          const end = reference.value! + sum(steps!.map(({ value }) => value));
          expect(near(end, place.value!)).toBe(true);
        }
      }),
    );
  });

  it('given a part that takes more than such cars take, names it and no other', () => {
    const cars = Array.from({ length: 20 }, (_, n) => aCar({ branch: n % 2, parts: [50, 10] }));
    const slow = cars.map((one) =>
      one.branch === 1 ? { ...one, parts: [50, 30] as [number, number] } : one,
    );
    const reference = funnelReference('overrun', cellsOf(slow));
    const place = placeInFunnel(cellsOf(slow.filter(({ branch }) => branch === 1)), reference);
    const values = stepsOf(place, reference, NAMES)!.map(({ value }) => value);
    expect(values.map((value) => value.toFixed(6))).toEqual(['0.000000', '0.000000', '0.100000']);
  });

  it('given too few cars to expect anything, has none, though the value be told', () => {
    const reference = funnelReference('margin', rot(1, 50, 10));
    expect(stepsOf(placeInFunnel(rot(1, 4, 1), reference), reference, ['all'])).toBeUndefined();
  });
});

describe('squaresAbout', () => {
  it('given cars and a rate, is what counting them one by one gives', () => {
    fc.assert(
      fc.property(fleets, fc.double({ min: -2, max: 3, noNaN: true }), (cars, r) => {
        const counted = sum(cars.map((one) => (a(one) - r * one.e) ** 2));
        expect(near(squaresAbout(cellsOf(cars), r), counted, 1e-7)).toBe(true);
      }),
    );
  });
});

/** One cell of cars, so many of them with rot. */
function rot(key: number, cars: number, rotten: number): FunnelCell[] {
  return [{ key, cars, e: cars, parts: [rotten], aa: rotten, ae: rotten, ee: cars }];
}

/** One cell of cars under warranty for so many thousand years together. */
function claims(cars: number, e: number, made: number): FunnelCell[] {
  return [{ key: 1, cars, e, parts: [made], aa: made, ae: 0, ee: 0 }];
}

function poisson(mean: number, count: number): number {
  return Array.from({ length: count }, (_, n) => mean / (n + 1)).reduce(
    (product, factor) => product * factor,
    Math.exp(-mean),
  );
}

/** Within rounding of figures of this size. */
function near(found: number, wanted: number, reach = 1e-9): boolean {
  return Math.abs(found - wanted) <= reach * Math.max(1, Math.abs(wanted));
}
