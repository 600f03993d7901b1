import { compensatedSum } from './compensated-sum';
import { requireFinite } from './require-finite';

/** Mean range of two normal values in standard deviations, as published to three decimals and fixed by rule 5. */
const D2 = 1.128;

/** Centre and natural limits of an individuals chart. */
export interface XmrLimits {
  /** How many values stand behind the limits. */
  n: number;
  centre: number;
  lower: number;
  upper: number;
  meanMovingRange: number;
}

/**
 * Limits of an individuals and moving-range chart: mean ± 3/1.128 × mean moving range of span 2 (rule 5), not clipped to any
 * range (rule 6). `undefined` with fewer than 2 values.
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, section 6.3.2.2 "Individuals Control Charts".
 */
export function xmrLimits(values: ArrayLike<number>): XmrLimits | undefined {
  const n = values.length;
  if (n < 2) return undefined;
  const movingRanges = new Float64Array(n - 1);
  for (let index = 1; index < n; index += 1) {
    const before = requireFinite(values[index - 1], 'value');
    movingRanges[index - 1] = Math.abs(requireFinite(values[index], 'value') - before);
  }
  // A mean lies among its values; rounding could put that of equal ones a hair beside them, and every one outside.
  const [least, most] = rangeOf(values);
  const centre = Math.min(Math.max(compensatedSum(values) / n, least), most);
  const meanMovingRange = compensatedSum(movingRanges) / (n - 1);
  const reach = (3 / D2) * meanMovingRange;
  return { n, centre, lower: centre - reach, upper: centre + reach, meanMovingRange };
}

function rangeOf(values: ArrayLike<number>): [number, number] {
  let [least, most] = [Infinity, -Infinity];
  for (let index = 0; index < values.length; index += 1) {
    least = Math.min(least, values[index] as number);
    most = Math.max(most, values[index] as number);
  }
  return [least, most];
}
