const HALF_LOG_TWO_PI = 0.9189385332046727;
/** From here on the asymptotic series reaches the last digit. */
const FAR = 10;
/** B₂ₖ / (2k(2k − 1)), the coefficients of 1/x, 1/x³, 1/x⁵, … */
const STIRLING = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156];

/**
 * The natural logarithm of the gamma function of a positive number.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 6.1.41 (Stirling's series).
 */
export function logGamma(x: number): number {
  return (x - 0.5) * Math.log(x) - x + HALF_LOG_TWO_PI + stirlingError(x);
}

/**
 * What Stirling's formula (x − ½) ln x − x + ½ ln 2π leaves of ln Γ(x). Kept apart because densities of large shapes need
 * it alone: the rest of ln Γ cancels there, and with it all digits.
 *
 * Source: Abramowitz and Stegun (1964), 6.1.41; below 10 the recurrence Γ(x + 1) = x Γ(x), 6.1.15, leads up to it.
 */
export function stirlingError(x: number): number {
  if (!(x > 0)) throw new RangeError(`the gamma function is taken of positive numbers, got ${x}`);
  let climbed = 0;
  let at = x;
  for (; at < FAR; at += 1) climbed += (at + 0.5) * Math.log1p(1 / at) - 1;
  const square = 1 / (at * at);
  let series = 0;
  for (let k = STIRLING.length - 1; k >= 0; k -= 1) series = series * square + (STIRLING[k] ?? 0);
  return climbed + series / at;
}
