import { ascending } from '../stats/quantile';

/** Quantiles of whole minutes, kept as the whole numbers that they are made of, so that no price drifts by a cent. */
export interface QuoteMinutes {
  /** Twice the median. */
  p50Halves: number;
  /** Five times the minutes within which 80 of 100 cars were done. */
  p80Fifths: number;
}

/** P50 and P80 by type 7: between two order statistics the median lies at a half, P80 at a whole number of fifths. */
export function quoteMinutes(minutes: ArrayLike<number>): QuoteMinutes {
  if (minutes.length === 0) throw new RangeError('quantiles need at least one car');
  const sorted = ascending(minutes);
  return { p50Halves: parts(sorted, 1, 2), p80Fifths: parts(sorted, 4, 5) };
}

/** The quantile share/whole of ascending whole numbers, times `whole`. */
function parts(sorted: Float64Array, share: number, whole: number): number {
  const position = share * (sorted.length - 1);
  const rest = position % whole;
  const index = (position - rest) / whole;
  const below = sorted[index] as number;
  const above = sorted[index + 1] ?? below;
  return whole * below + rest * (above - below);
}
