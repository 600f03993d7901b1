/** A number as numerator over denominator, so that a price at an exact cent is that cent. */
export interface Fraction {
  numerator: bigint;
  denominator: bigint;
}

/** What a car of the set costs at today's rates, each still unrounded (rule 49). */
export interface QuoteCost {
  labour: Fraction;
  product: Fraction;
  consumablesAndBoughtIn: Fraction;
}

/** A whole number over another, as often as said. */
export function fraction(numerator: number, denominator: number, times = 1): Fraction {
  return { numerator: BigInt(numerator) * BigInt(times), denominator: BigInt(denominator) };
}

/** The decimal that a number is written as: 0.45 is 45/100 and no double near it. */
export function decimal(value: number): Fraction {
  const [digits = '0', exponent = '0'] = value.toExponential().split('e');
  const [whole = '0', decimals = ''] = digits.split('.');
  const scale = Number(exponent) - decimals.length;
  const numerator = BigInt(whole + decimals);
  return scale < 0
    ? { numerator, denominator: 10n ** BigInt(-scale) }
    : { numerator: numerator * 10n ** BigInt(scale), denominator: 1n };
}

/** The sum of two fractions. */
export function plus(a: Fraction, b: Fraction): Fraction {
  return {
    numerator: a.numerator * b.denominator + b.numerator * a.denominator,
    denominator: a.denominator * b.denominator,
  };
}

/** A fraction rounded half up to a whole number; not for negative ones. */
export function roundedHalfUp({ numerator, denominator }: Fraction): number {
  return Number((2n * numerator + denominator) / (2n * denominator));
}

/**
 * The least whole cents that leave `marginShare` of the price after the cost and a fee of `feeShare` of the price:
 * ⌈cost / (1 − fee − margin)⌉ (rule 49); `undefined` when fee and margin leave nothing of it, or so
 * little that no whole number can hold the price.
 */
export function quotePrice(
  cost: QuoteCost,
  feeShare: number,
  marginShare: number,
): number | undefined {
  const { numerator, denominator } = plus(
    plus(cost.labour, cost.product),
    cost.consumablesAndBoughtIn,
  );
  const taken = plus(decimal(feeShare), decimal(marginShare));
  const left = taken.denominator - taken.numerator;
  if (left <= 0n) return undefined;
  const [over, under] = [numerator * taken.denominator, denominator * left];
  const price = Number((over + under - 1n) / under);
  return Number.isSafeInteger(price) ? price : undefined;
}

/** Whether a fee and a margin together leave nothing of a price. */
export function leavesNothing(feeShare: number, marginShare: number): boolean {
  const { numerator, denominator } = plus(decimal(feeShare), decimal(marginShare));
  return numerator >= denominator;
}
