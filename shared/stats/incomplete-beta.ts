import type { LogTails } from './incomplete-gamma';
import { stirlingError } from './log-gamma';
import { logShortfall } from './log-shortfall';

/**
 * The regularised incomplete beta function I (lower) of two shapes at x, its complement (upper), and the density over the
 * log-odds of x, all as natural logarithms. `y` is 1 − x: given apart, because near 1 the difference would lose its digits.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 26.5.8 (continued fraction, evaluated
 * by W. J. Lentz's method, Applied Optics 15 (1976) 668–671) and 26.5.2 (the other tail).
 */
export function incompleteBeta(a: number, b: number, x: number, y: number = 1 - x): LogTails {
  for (const shape of [a, b]) {
    if (!(shape > 0 && shape < Infinity))
      throw new RangeError(`a shape must be positive: ${shape}`);
  }
  if (!(x >= 0 && y >= 0 && x <= 1 && y <= 1)) throw new RangeError(`x must be 0 to 1, got ${x}`);
  if (x === 0) return { lower: -Infinity, upper: 0, density: -Infinity };
  if (y === 0) return { lower: 0, upper: -Infinity, density: -Infinity };
  const off = b * x - a * y;
  // ln of x^a y^b / B(a, b), counted from the peak: its large terms cancel exactly.
  const density =
    0.5 * Math.log((a / (a + b)) * (b / (2 * Math.PI))) -
    a * logShortfall(off / a, x + (b / a) * x) -
    b * logShortfall(-off / b, y + (a / b) * y) +
    (stirlingError(a + b) - stirlingError(a) - stirlingError(b));
  if (x < (a + 1) / (a + b + 2)) {
    const lower = Math.min(0, density + Math.log(fraction(a, b, x) / a));
    return { lower, upper: Math.log(-Math.expm1(lower)), density };
  }
  const upper = Math.min(0, density + Math.log(fraction(b, a, y) / b));
  return { lower: Math.log(-Math.expm1(upper)), upper, density };
}

/** 1/(1 + d₁/(1 + d₂/(1 + …))); about √max(a, b) levels matter near the mean. */
function fraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < 1e6; m += 1) {
    const even = ((m / (a + 2 * m - 1)) * ((b - m) * x)) / (a + 2 * m);
    d = 1 / (1 + even * d);
    c = 1 + even / c;
    value *= c * d;
    const odd = (((-a - m) / (a + 2 * m)) * ((a + b + m) * x)) / (a + 2 * m + 1);
    d = 1 / (1 + odd * d);
    c = 1 + odd / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) break;
  }
  return value;
}
