import { requireFinite } from './require-finite';

/** What a value says about its chart: beyond a limit, or one of a long run on one side of the centre. */
export type ChartSignal = 'outside_low' | 'outside_high' | 'run_low' | 'run_high';

/** Values on one side of the centre that make a run, flagged from this one on (rule 6). */
const RUN_LENGTH = 8;

/**
 * The signal of each value of a control chart, in order (rule 6): strictly beyond a limit; or 8 or more consecutive values
 * strictly on one side of the centre, from the 8th on. A value on the centre ends a run, one on a limit is not outside, and
 * outside wins over run. Without limits every signal is null.
 *
 * Source: the run of 8 is test 4 of the Western Electric "Statistical Quality Control Handbook" (1956), its first test the limits.
 */
export function chartSignals(
  values: ArrayLike<number>,
  limits: { centre: number; lower: number; upper: number } | undefined,
): (ChartSignal | null)[] {
  if (!limits) return Array.from(values, () => null);
  const { centre, lower, upper } = limits;
  if (!(lower <= centre && centre <= upper)) {
    throw new RangeError(`limits must enclose their centre: ${lower}, ${centre}, ${upper}`);
  }
  let side = 0;
  let length = 0;
  return Array.from(values, (value) => {
    const now = Math.sign(requireFinite(value, 'value') - centre);
    length = now === side ? length + 1 : 1;
    side = now;
    if (value < lower) return 'outside_low';
    if (value > upper) return 'outside_high';
    if (side === 0 || length < RUN_LENGTH) return null;
    return side < 0 ? 'run_low' : 'run_high';
  });
}
