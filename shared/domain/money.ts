/**
 * Exact money arithmetic: whole numbers of minor units in and out, every line rounded half up, floor(x + ½), by integer
 * arithmetic (rules 1 and 10). With the limits of rule 55 no product passes 10¹⁵, well inside the 2⁵³ up to which a number
 * holds every whole number; beyond that these functions throw rather than drift.
 */

const MINUTES_IN_AN_HOUR = 60;
const MILLILITRES_IN_A_LITRE = 1000;
const MICROS_IN_ONE = 1_000_000;

/** numerator / denominator rounded half up, floor(x + ½): 2.5 → 3, −2.5 → −2. Whole numbers in, a whole number out. */
export function roundHalfUp(numerator: number, denominator: number): number {
  requireWhole(numerator, 'numerator');
  if (requireWhole(denominator, 'denominator') <= 0) {
    throw new RangeError(`denominator must be above 0, got ${denominator}`);
  }
  const towardsZero = numerator % denominator;
  const rest = towardsZero < 0 ? towardsZero + denominator : towardsZero;
  // Exact: the difference is a multiple of the denominator.
  const floor = (numerator - towardsZero) / denominator - (towardsZero < 0 ? 1 : 0);
  // `rest` against what is left of the denominator: doubling it could pass 2⁵³.
  return rest >= denominator - rest ? floor + 1 : floor;
}

/** Labour of one stage in minor units: minutes × hourly cost / 60, rounded half up (rule 1). */
export function labourCents(minutes: number, hourlyCostCents: number): number {
  return roundHalfUp(
    product(minutes, 'minutes', hourlyCostCents, 'hourlyCostCents'),
    MINUTES_IN_AN_HOUR,
  );
}

/** One line of product in minor units: ml × cost per litre / 1000, rounded half up (rule 1). */
export function productCents(ml: number, costPerLitreCents: number): number {
  return roundHalfUp(
    product(ml, 'ml', costPerLitreCents, 'costPerLitreCents'),
    MILLILITRES_IN_A_LITRE,
  );
}

/** One line of consumables in minor units: quantity × unit cost. */
export function consumableCents(quantity: number, unitCostCents: number): number {
  return product(quantity, 'quantity', unitCostCents, 'unitCostCents');
}

/** The network fee of one job in minor units: revenue × fee rate, rounded half up; the rate in millionths (rule 10). */
export function feeCents(revenueCents: number, feeRateMicros: number): number {
  return roundHalfUp(
    product(revenueCents, 'revenueCents', feeRateMicros, 'feeRateMicros'),
    MICROS_IN_ONE,
  );
}

/** Whether a number is written with at most six decimals (rule 10). */
export function hasSixDecimals(rate: number): boolean {
  // Division of whole numbers rounds correctly, so it gives the very double that six decimals are read as.
  return Number.isFinite(rate) && Math.round(rate * MICROS_IN_ONE) / MICROS_IN_ONE === rate;
}

/** A fee rate as whole millionths: 0.065 → 65000. Throws on anything but a fraction of at most six decimals. */
export function feeRateMicros(rate: number): number {
  if (!(rate >= 0 && rate <= 1 && hasSixDecimals(rate))) {
    throw new RangeError(`a fee rate is 0 to 1 with at most 6 decimals, got ${rate}`);
  }
  return Math.round(rate * MICROS_IN_ONE);
}

/** The fee rate of whole millionths: 65000 → 0.065; the inverse of `feeRateMicros`. */
export function rateOfMicros(micros: number): number {
  return requireWhole(micros, 'micros') / MICROS_IN_ONE;
}

function product(a: number, nameOfA: string, b: number, nameOfB: string): number {
  if (requireWhole(a, nameOfA) < 0) throw new RangeError(`${nameOfA} must not be negative`);
  if (requireWhole(b, nameOfB) < 0) throw new RangeError(`${nameOfB} must not be negative`);
  return requireWhole(a * b, `${nameOfA} × ${nameOfB}`);
}

function requireWhole(value: number, name: string): number {
  if (!Number.isSafeInteger(value)) {
    throw new RangeError(`${name} must be a whole number below 2⁵³, got ${value}`);
  }
  return value;
}
