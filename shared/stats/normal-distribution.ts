import { requireFinite } from './require-finite';

/** The standard normal quantile of 0.975 as rule 26 fixes it for intervals. */
export const Z_95 = 1.959964;

/** Below this the series from the middle is accurate in the tail too; above it the continued fraction converges fast. */
const FAR = 1.75;
/** Levels of the continued fraction, enough at FAR for 14 digits. */
const LEVELS = 80;

/**
 * The probability of the standard normal beyond z, accurate to about 14 digits however small: never 1 − cdf.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 26.2.11 (series) and 26.2.14
 * (continued fraction).
 */
export function normalUpperTail(z: number): number {
  if (Number.isNaN(z)) throw new RangeError('z must be a number');
  if (z < 0) return 1 - normalUpperTail(-z);
  // From 38.5 on the tail is smaller than the smallest double.
  if (z > 39) return 0;
  return z < FAR ? 0.5 - fromTheMiddle(z) : density(z) / tailFraction(z);
}

/** The two-sided p of a standard normal statistic: the probability of being at least as far from 0. */
export function twoSidedP(z: number): number {
  return 2 * normalUpperTail(Math.abs(z));
}

/**
 * The standard normal quantile of a probability strictly between 0 and 1; 0 and 1 give −∞ and ∞.
 *
 * Source: start from M. Abramowitz and I. A. Stegun (1964), 26.2.23 (4.5e-4), then Halley's iteration on the upper tail.
 */
export function normalQuantile(p: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`p must be 0 to 1, got ${p}`);
  if (p > 0.5) return -normalQuantile(1 - p);
  if (p === 0) return Number.NEGATIVE_INFINITY;
  let z = roughUpperQuantile(p);
  for (let step = 0; step < 3; step += 1) {
    // Near the middle the differences from ½ are compared, so that no digit is lost there.
    const miss = z < FAR ? 0.5 - p - fromTheMiddle(z) : normalUpperTail(z) - p;
    const newton = miss / density(z);
    z += newton / (1 - (newton * z) / 2);
  }
  return -requireFinite(z, 'quantile');
}

function density(z: number): number {
  // exp(−z²/2) in two factors, the first of an exact square: z² alone would lose digits far out.
  const near = Math.fround(z);
  return (
    (Math.exp(-0.5 * near * near) * Math.exp(-0.5 * (z - near) * (z + near))) /
    Math.sqrt(2 * Math.PI)
  );
}

/** The probability between 0 and z: density × (z + z³/3 + z⁵/(3·5) + …). */
function fromTheMiddle(z: number): number {
  let term = z;
  let sum = z;
  for (let odd = 3; Math.abs(term) > Math.abs(sum) * (Number.EPSILON / 4); odd += 2) {
    term *= (z * z) / odd;
    sum += term;
  }
  return density(z) * sum;
}

/** density / upper tail as z + 1/(z + 2/(z + 3/(z + …))), from the inside out. */
function tailFraction(z: number): number {
  // The rest beyond the last level is near the fixed point f = z + level/f; starting there halves the levels needed.
  let fraction = (z + Math.sqrt(z * z + 4 * LEVELS)) / 2;
  for (let level = LEVELS; level > 0; level -= 1) fraction = z + level / fraction;
  return fraction;
}

function roughUpperQuantile(p: number): number {
  const t = Math.sqrt(-2 * Math.log(p));
  return (
    t -
    (2.515517 + t * (0.802853 + t * 0.010328)) /
      (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
  );
}
