import { normalQuantile } from './normal-distribution';

/** A share with its score interval, all 0 … 1. */
export interface WilsonInterval {
  estimate: number;
  lower: number;
  upper: number;
}

/**
 * The score interval of a share, without continuity correction; exactly 0 below when there is no success and exactly 1 above
 * when there is no failure. `undefined` when n is 0.
 *
 * Source: E. B. Wilson, "Probable inference, the law of succession, and statistical inference", JASA 22 (1927) 209–212;
 * method 3 of R. G. Newcombe, Statistics in Medicine 17 (1998) 857–872.
 */
export function wilsonInterval(
  successes: number,
  n: number,
  level = 0.95,
): WilsonInterval | undefined {
  if (!Number.isSafeInteger(n) || n < 0) {
    throw new RangeError(`n must be a whole number, got ${n}`);
  }
  if (!Number.isSafeInteger(successes) || successes < 0 || successes > n) {
    throw new RangeError(`successes must be a whole number from 0 to ${n}, got ${successes}`);
  }
  if (!(level > 0 && level < 1)) {
    throw new RangeError(`level must be between 0 and 1, got ${level}`);
  }
  if (n === 0) return undefined;
  const z = -normalQuantile((1 - level) / 2);
  const estimate = successes / n;
  const shrink = 1 + (z * z) / n;
  const centre = (estimate + (z * z) / (2 * n)) / shrink;
  const half = (z / shrink) * Math.sqrt((estimate * (1 - estimate)) / n + (z / (2 * n)) ** 2);
  return {
    estimate,
    lower: successes === 0 ? 0 : Math.max(0, centre - half),
    upper: successes === n ? 1 : Math.min(1, centre + half),
  };
}
