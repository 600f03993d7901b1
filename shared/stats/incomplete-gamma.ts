import { stirlingError } from './log-gamma';
import { logShortfall } from './log-shortfall';

/** Both tails of a distribution at a point, by their natural logarithms, with that of its density on the searched scale. */
export interface LogTails {
  lower: number;
  upper: number;
  density: number;
}

/**
 * The regularised incomplete gamma functions P (lower) and Q (upper) of a shape at x, and the density over ln x, all as
 * natural logarithms, so that none underflows. The tail away from the mean is computed directly, never as 1 − the other.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 6.5.29 (series) and 6.5.31 (continued
 * fraction, evaluated by W. J. Lentz's method, Applied Optics 15 (1976) 668–671).
 */
export function incompleteGamma(shape: number, x: number): LogTails {
  if (!(shape > 0 && shape < Infinity))
    throw new RangeError(`shape must be positive, got ${shape}`);
  if (!(x >= 0)) throw new RangeError(`x must not be negative, got ${x}`);
  if (x === 0) return { lower: -Infinity, upper: 0, density: -Infinity };
  if (x === Infinity) return { lower: 0, upper: -Infinity, density: -Infinity };
  // ln of x^shape e^−x / Γ(shape), counted from the peak: its large terms cancel exactly.
  const density =
    0.5 * Math.log(shape / (2 * Math.PI)) -
    shape * logShortfall((x - shape) / shape, x / shape) -
    stirlingError(shape);
  if (x < shape + 1) {
    const lower = Math.min(0, density + Math.log(series(shape, x)));
    return { lower, upper: Math.log(-Math.expm1(lower)), density };
  }
  const upper = Math.min(0, density + Math.log(fraction(shape, x)));
  return { lower: Math.log(-Math.expm1(upper)), upper, density };
}

/** 1/a + x/(a(a + 1)) + x²/(a(a + 1)(a + 2)) + …; about √a terms matter near x = a. */
function series(shape: number, x: number): number {
  let term = 1 / shape;
  let sum = term;
  for (let k = shape + 1; term > sum * (Number.EPSILON / 8); k += 1) {
    term *= x / k;
    sum += term;
  }
  return sum;
}

/** 1/(x + 1 − a − 1(1 − a)/(x + 3 − a − 2(2 − a)/(x + 5 − a − …))). */
function fraction(shape: number, x: number): number {
  let b = x + 1 - shape;
  let c = Infinity;
  let d = 1 / b;
  let value = d;
  for (let k = 1; k < 1e6; k += 1) {
    const a = -k * (k - shape);
    b += 2;
    d = 1 / (b + a * d);
    c = b + a / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) break;
  }
  return value;
}
