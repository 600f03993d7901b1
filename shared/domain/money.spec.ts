import fc from 'fast-check';
import {
  consumableCents,
  feeCents,
  feeRateMicros,
  hasSixDecimals,
  labourCents,
  productCents,
  rateOfMicros,
  roundHalfUp,
} from './money';

/** floor(numerator / denominator + ½) in unlimited whole numbers: the definition of rule 1, computed another way. */
function roundedInBigInt(numerator: bigint, denominator: bigint): number {
  const doubled = 2n * numerator + denominator;
  const quotient = doubled / (2n * denominator);
  const below = doubled < 0n && quotient * 2n * denominator !== doubled;
  return Number(below ? quotient - 1n : quotient);
}

/** Limits of rule 55. */
const cents = fc.integer({ min: 0, max: 1_000_000_000 });
const minutes = fc.integer({ min: 0, max: 100_000 });
const millilitres = fc.integer({ min: 0, max: 1_000_000 });
const micros = fc.integer({ min: 0, max: 1_000_000 });

describe('roundHalfUp', () => {
  it.each([
    [5, 2, 3],
    [4, 3, 1],
    [-5, 2, -2],
    [-7, 3, -2],
    [-1, 2, 0],
    [0, 7, 0],
    [1, 3, 0],
    [2, 3, 1],
  ])('given %d / %d, gives %d', (numerator, denominator, expected) => {
    expect(roundHalfUp(numerator, denominator)).toBe(expected);
  });

  it('given the largest whole number a double holds, still rounds exactly', () => {
    expect(roundHalfUp(Number.MAX_SAFE_INTEGER, 2)).toBe(4503599627370496);
    expect(roundHalfUp(Number.MAX_SAFE_INTEGER, Number.MAX_SAFE_INTEGER)).toBe(1);
  });

  it('given any whole numbers, equals the definition in unlimited arithmetic', () => {
    fc.assert(
      fc.property(fc.maxSafeInteger(), fc.integer({ min: 1 }), (numerator, denominator) => {
        expect(roundHalfUp(numerator, denominator)).toBe(
          roundedInBigInt(BigInt(numerator), BigInt(denominator)),
        );
      }),
      { numRuns: 2000 },
    );
  });

  it('given exact halves, rounds each up', () => {
    fc.assert(
      fc.property(fc.integer(), fc.integer({ min: 1, max: 1000 }), (whole, half) => {
        expect(roundHalfUp((2 * whole + 1) * half, 2 * half)).toBe(whole + 1);
      }),
    );
  });

  it('given a fraction, a zero or negative denominator or a number past 2⁵³, throws', () => {
    expect(() => roundHalfUp(1.5, 2)).toThrow(RangeError);
    expect(() => roundHalfUp(1, 0)).toThrow(RangeError);
    expect(() => roundHalfUp(1, -2)).toThrow(RangeError);
    expect(() => roundHalfUp(2 ** 53, 2)).toThrow(RangeError);
    expect(() => roundHalfUp(Number.NaN, 2)).toThrow(RangeError);
  });
});

describe('labourCents', () => {
  it('given 1 minute at 30 an hour, rounds half a minor unit up', () => {
    expect(labourCents(1, 30)).toBe(1);
    expect(labourCents(1, 29)).toBe(0);
  });

  it('given anything within the limits, equals the definition in unlimited arithmetic', () => {
    fc.assert(
      fc.property(minutes, cents, (m, c) => {
        expect(labourCents(m, c)).toBe(roundedInBigInt(BigInt(m) * BigInt(c), 60n));
      }),
      { numRuns: 2000 },
    );
  });
});

describe('productCents', () => {
  it('given 4200 ml at 1215 a litre, gives 5103', () => {
    expect(productCents(4200, 1215)).toBe(5103);
    expect(productCents(1, 500)).toBe(1);
    expect(productCents(1, 499)).toBe(0);
  });

  it('given anything within the limits, equals the definition in unlimited arithmetic', () => {
    fc.assert(
      fc.property(millilitres, cents, (ml, c) => {
        expect(productCents(ml, c)).toBe(roundedInBigInt(BigInt(ml) * BigInt(c), 1000n));
      }),
      { numRuns: 2000 },
    );
  });
});

describe('consumableCents', () => {
  it('given a quantity and a unit cost, multiplies them exactly', () => {
    expect(consumableCents(6, 45)).toBe(270);
    expect(consumableCents(100_000, 1_000_000_000)).toBe(100_000_000_000_000);
  });

  it('given a product past 2⁵³, throws instead of drifting', () => {
    expect(() => consumableCents(1_000_000_000, 1_000_000_000)).toThrow(RangeError);
  });
});

describe('feeCents', () => {
  it('given a fee that doubles get wrong, rounds the exact half up', () => {
    // 50 × 0.29 is 14.5 exactly, but 14.499999999999998 in doubles.
    expect(Math.floor(50 * 0.29 + 0.5)).toBe(14);
    expect(feeCents(50, feeRateMicros(0.29))).toBe(15);
  });

  it('given anything within the limits, equals the definition in unlimited arithmetic', () => {
    fc.assert(
      fc.property(cents, micros, (revenue, rate) => {
        expect(feeCents(revenue, rate)).toBe(
          roundedInBigInt(BigInt(revenue) * BigInt(rate), 1_000_000n),
        );
      }),
      { numRuns: 2000 },
    );
  });

  it('given the largest revenue at the full rate, gives the revenue', () => {
    expect(feeCents(1_000_000_000, 1_000_000)).toBe(1_000_000_000);
  });

  it('given a negative or fractional argument, throws', () => {
    expect(() => feeCents(-1, 1)).toThrow(RangeError);
    expect(() => feeCents(1, -1)).toThrow(RangeError);
    expect(() => feeCents(1, 0.065)).toThrow(RangeError);
  });
});

describe('feeRateMicros', () => {
  it('given every rate of six decimals, is undone by rateOfMicros', () => {
    fc.assert(
      fc.property(micros, (m) => {
        expect(feeRateMicros(rateOfMicros(m))).toBe(m);
        expect(feeRateMicros(Number((m / 1e6).toFixed(6)))).toBe(m);
        expect(feeRateMicros(JSON.parse(`0.${String(m % 1_000_000).padStart(6, '0')}`))).toBe(
          m % 1_000_000,
        );
      }),
      { numRuns: 2000 },
    );
  });

  it.each([0.0000001, 0.0650001 + 1e-9, 1.000001, -0.01, Number.NaN, Number.POSITIVE_INFINITY])(
    'given %d, which is no fraction of six decimals, throws',
    (rate) => {
      expect(() => feeRateMicros(rate)).toThrow(RangeError);
    },
  );
});

describe('hasSixDecimals', () => {
  it('given the double next to a rate, does not take it for the rate', () => {
    expect(hasSixDecimals(0.065)).toBe(true);
    expect(hasSixDecimals(0.065 + Number.EPSILON / 16)).toBe(false);
    expect(0.065 + Number.EPSILON / 16).not.toBe(0.065);
  });

  it('given what is no number, says no', () => {
    expect(hasSixDecimals(Number.NaN)).toBe(false);
    expect(hasSixDecimals(Number.POSITIVE_INFINITY)).toBe(false);
  });
});
