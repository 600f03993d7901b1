/** Two one-sided cumulative sums, one value of each a point, and the points (from 0) at which one of them is beyond h. */
export interface TabularCusum {
  high: number[];
  low: number[];
  signals: number[];
}

/**
 * The tabular cumulative sum chart: how far values have run away above (`high`) or below (`low`) their target, allowing `k` at
 * each point; beyond `h` (strictly) is a signal. Both begin at 0. `target`, `k` and `h` are in the unit of the values.
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3.
 */
export function tabularCusum(
  values: readonly number[],
  { target, k, h }: { target: number; k: number; h: number },
): TabularCusum {
  const chart: TabularCusum = { high: [], low: [], signals: [] };
  let high = 0;
  let low = 0;
  values.forEach((value, point) => {
    high = Math.max(0, high + value - target - k);
    low = Math.max(0, low + target - k - value);
    chart.high.push(high);
    chart.low.push(low);
    if (high > h || low > h) chart.signals.push(point);
  });
  return chart;
}
