import type { OverrunGroup } from '#shared/contracts/overrun';
import type { IntervalRow, Stand } from '../../charts/dot-interval/dot-interval-input';
import type { AxisMark } from '../../charts/value-axis';
import { formatCount } from '../../ui/format';
import { noFigureText, ratioText, Z95 } from './overrun-words';

/** Ratios that have a name of their own. */
export const RATIO_MARKS: readonly AxisMark[] = [
  { value: 0.5, text: 'half' },
  { value: 1, text: 'as estimated' },
  { value: 1.5, text: 'half again' },
  { value: 2, text: 'twice' },
  { value: 4, text: 'four times' },
];

/** One group as dot and interval; it stands above or below where the whole interval misses the reference. */
export function intervalRow(
  group: OverrunGroup,
  label: string,
  { reference, chosen }: { readonly reference: number; readonly chosen: boolean },
): IntervalRow {
  const { ratio, ratioStandardError, cars } = group;
  const reach = ratioStandardError === null ? null : Z95 * ratioStandardError;
  const lower = ratio === null || reach === null ? null : ratio - reach;
  const upper = ratio === null || reach === null ? null : ratio + reach;
  const stand = standOf(lower, upper, reference);
  return {
    key: group.key,
    label,
    count: formatCount(cars),
    value: ratio,
    lower,
    upper,
    text: ratio === null ? noFigureText(group.estimatedMinutes, cars) : ratioText(ratio),
    stand,
    word: stand === 'as_expected' ? '' : stand,
    chosen,
  };
}

function standOf(lower: number | null, upper: number | null, reference: number): Stand {
  if (lower !== null && lower > reference) return 'above';
  if (upper !== null && upper < reference) return 'below';
  return 'as_expected';
}
