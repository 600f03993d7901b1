import fc from 'fast-check';
import { chainLadder, originError } from './chain-ladder';

/** A triangle of paid amounts that never fall, every one above 0 from the start. */
const triangles = fc
  .integer({ min: 4, max: 8 })
  .chain((size) =>
    fc.tuple(
      ...Array.from({ length: size }, (_, row) =>
        fc.array(fc.integer({ min: 1, max: 50_000 }), {
          minLength: size - row,
          maxLength: size - row,
        }),
      ),
    ),
  )
  .map((rows) => rows.map(cumulated));

describe('chainLadder', () => {
  it('given no row, is undefined', () => {
    expect(chainLadder([])).toBeUndefined();
  });

  it('given one row, expects nothing more and knows no error', () => {
    const alone = { latest: 7, ultimate: 7, outstanding: 0 };
    expect(chainLadder([[7]])).toEqual({ factors: [], origins: [alone], total: alone });
  });

  it('given three rows, has factors and no standard error (rule 19)', () => {
    const ladder = chainLadder([[10, 20, 30], [10, 24], [8]]);
    expect(ladder?.factors.map(({ from, to }) => [from, to])).toEqual([
      [20, 44],
      [20, 30],
    ]);
    expect(ladder?.origins[2]?.ultimate).toBeCloseTo(8 * 2.2 * 1.5, 12);
    expect(ladder?.total).not.toHaveProperty('standardError');
  });

  it('given a column of zeros, keeps the factor 1 over it and knows no error (rule 19)', () => {
    const ladder = chainLadder([[0, 0, 30, 40], [0, 0, 20], [0, 0], [0]]);
    expect(ladder?.factors.map((one) => one.factor)).toEqual([1, 1, 40 / 30]);
    expect(ladder?.factors[0]).not.toHaveProperty('sigmaSquared');
    expect(ladder?.origins.every((origin) => origin.standardError === undefined)).toBe(true);
  });

  it('given an origin that begins at 0, leaves it out of sigma² and of its degrees of freedom (rule 19)', () => {
    // Ratios of the two that count are 2 and 4 of 10 each, around 65/20: sigma² = 10·1.25² + 10·0.75² over one degree.
    const ladder = chainLadder([[10, 20, 22, 24], [0, 5, 6], [10, 40], [12]]);
    expect(ladder?.factors[0]?.factor).toBe(65 / 20);
    expect(ladder?.factors[0]?.sigmaSquared).toBeCloseTo(10 * 1.25 ** 2 + 10 * 0.75 ** 2, 10);
    expect(ladder?.total.standardError).toBeGreaterThan(0);
  });

  it('given rows that grow alike, knows what comes without error', () => {
    const ladder = chainLadder([[10, 20, 30, 30], [20, 40, 60], [30, 60], [5]]);
    expect(ladder?.origins[3]).toEqual({
      latest: 5,
      ultimate: 15,
      outstanding: 10,
      standardError: 0,
    });
    expect(ladder?.total.standardError).toBe(0);
  });

  it('given any triangle, never expects less than was paid, and adds up', () => {
    fc.assert(
      fc.property(triangles, (triangle) => {
        const ladder = chainLadder(triangle);
        if (!ladder) throw new Error('no ladder');
        const origins = ladder.origins;
        for (const origin of origins) {
          expect(origin.outstanding).toBeGreaterThanOrEqual(-1e-9);
          expect(origin.latest + origin.outstanding).toBeCloseTo(origin.ultimate, 4);
        }
        expect(origins[0]?.standardError).toBe(0);
        const sum = origins.reduce((all, origin) => all + origin.outstanding, 0);
        expect(ladder.total.outstanding / sum).toBeCloseTo(1, 9);
        // Origins share the factors' errors: the total is less sure than independent origins would be, never more than their sum.
        const errors = origins.map((origin) => origin.standardError ?? Number.NaN);
        const total = ladder.total.standardError ?? Number.NaN;
        expect(total * (1 + 1e-12)).toBeGreaterThanOrEqual(Math.hypot(...errors));
        expect(total).toBeLessThanOrEqual(errors.reduce((all, one) => all + one, 0) * (1 + 1e-12));
      }),
    );
  });

  it('given another unit of money, answers in that unit', () => {
    fc.assert(
      fc.property(triangles, (triangle) => {
        const cents = chainLadder(triangle);
        const whole = chainLadder(triangle.map((row) => row.map((value) => value / 100)));
        expect((whole?.total.ultimate ?? 0) * 100).toBeCloseTo(cents?.total.ultimate ?? 0, 3);
        expect((whole?.total.standardError ?? 0) * 100).toBeCloseTo(
          cents?.total.standardError ?? 0,
          3,
        );
      }),
    );
  });

  it.each([
    ['a row too short', [[1, 2], []]],
    [
      'a row too long',
      [
        [1, 2],
        [1, 2],
      ],
    ],
    ['a negative amount', [[1, -2], [1]]],
    ['no number', [[1, Number.NaN], [1]]],
  ])('given %s, throws', (_circumstance, triangle) => {
    expect(() => chainLadder(triangle)).toThrow(RangeError);
  });
});

describe('originError', () => {
  it('given parts of one origin, gives expectations that add up but errors that do not fall below the whole', () => {
    fc.assert(
      fc.property(triangles, fc.double({ min: 0, max: 1, noNaN: true }), (triangle, part) => {
        const ladder = chainLadder(triangle);
        if (!ladder) throw new Error('no ladder');
        const latest = triangle.at(-1)?.[0] ?? 0;
        const whole = originError(latest, 0, ladder) ?? Number.NaN;
        expect(whole).toBe(ladder.origins.at(-1)?.standardError);
        const one = originError(latest * part, 0, ladder) ?? Number.NaN;
        const other = originError(latest * (1 - part), 0, ladder) ?? Number.NaN;
        expect(one + other).toBeGreaterThanOrEqual(whole * (1 - 1e-9));
      }),
    );
  });

  it('given nothing paid yet, is 0 rather than nothing over nothing', () => {
    const ladder = chainLadder([[10, 20, 22, 24], [9, 25, 26], [10, 40], [12]]);
    expect(ladder && originError(0, 0, ladder)).toBe(0);
  });

  it('given an origin at the end of the triangle, is 0', () => {
    const ladder = chainLadder([[10, 20, 22, 24], [9, 25, 26], [10, 40], [12]]);
    expect(ladder && originError(24, 3, ladder)).toBe(0);
  });

  it('given a ladder without errors, is undefined', () => {
    const ladder = chainLadder([[10, 20], [8]]);
    expect(ladder && originError(8, 0, ladder)).toBeUndefined();
  });
});

function cumulated(amounts: readonly number[]): number[] {
  let sum = 0;
  return amounts.map((amount) => (sum += amount));
}
