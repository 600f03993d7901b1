import { requireFinite } from './require-finite';

/**
 * The sum of a list, its rounding errors carried along and added at the end; 0 for an empty list.
 *
 * Source: A. Neumaier, "Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen", ZAMM 54 (1974) 39–51.
 */
export function compensatedSum(values: ArrayLike<number>): number {
  let sum = 0;
  let compensation = 0;
  for (let index = 0; index < values.length; index += 1) {
    const value = requireFinite(values[index], 'value');
    const next = sum + value;
    compensation += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return sum + compensation;
}
