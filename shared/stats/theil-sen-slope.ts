import { ascending, quantile } from './quantile';
import { requireFinite } from './require-finite';

/**
 * The median of the slopes of all pairs (value units per time unit), pairs of equal time left out; exact, by taking every
 * pair, so meant for a chart's length and not for thousands of points. `undefined` when no two times differ.
 *
 * Source: P. K. Sen, "Estimates of the regression coefficient based on Kendall's tau", JASA 63 (1968) 1379–1389.
 */
export function theilSenSlope(
  times: ArrayLike<number>,
  values: ArrayLike<number>,
): number | undefined {
  const n = times.length;
  if (values.length !== n) {
    throw new RangeError(`as many values as times: ${values.length} against ${n}`);
  }
  const slopes = new Float64Array((n * (n - 1)) / 2);
  let count = 0;
  for (let later = 0; later < n; later += 1) {
    const time = requireFinite(times[later], 'time');
    const value = requireFinite(values[later], 'value');
    for (let earlier = 0; earlier < later; earlier += 1) {
      const run = time - (times[earlier] as number);
      // Adding 0 makes −0 a 0, so that a level trend never depends on the order of its points.
      if (run !== 0) slopes[count++] = (value - (values[earlier] as number)) / run + 0;
    }
  }
  return quantile(ascending(slopes.subarray(0, count)), 0.5);
}
