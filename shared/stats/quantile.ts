import { requireFinite } from './require-finite';

/** A sorted copy, smallest first, as `quantile` wants it. */
export function ascending(values: ArrayLike<number>): Float64Array {
  const sorted = new Float64Array(values).sort();
  // NaN sorts last, infinities to the ends: two looks find any of them.
  if (sorted.length > 0) {
    requireFinite(sorted[0], 'value');
    requireFinite(sorted[sorted.length - 1], 'value');
  }
  return sorted;
}

/**
 * The quantile p (0 … 1) of values that are already in ascending order, type 7: linear between the order statistics, the
 * smallest being quantile 0 and the largest quantile 1. `undefined` for an empty list.
 *
 * Source: R. J. Hyndman and Y. Fan, "Sample quantiles in statistical packages", The American Statistician 50 (1996) 361–365.
 */
export function quantile(sorted: ArrayLike<number>, p: number): number | undefined {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`p must be 0 to 1, got ${p}`);
  if (sorted.length === 0) return undefined;
  const last = sorted.length - 1;
  const position = last * p;
  const index = Math.floor(position);
  const below = requireFinite(sorted[index], 'value');
  const above = requireFinite(sorted[Math.min(index + 1, last)], 'value');
  const [least, most] = [sorted[0] as number, sorted[last] as number];
  if (!(least <= below && below <= above && above <= most)) {
    throw new RangeError('quantile needs its values in ascending order');
  }
  // Never past the upper neighbour, whatever the product rounds to.
  return Math.min(below + (position - index) * (above - below), above);
}
