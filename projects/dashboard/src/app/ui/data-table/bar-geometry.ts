/** A bar in a cell, in per cent of the cell's width. */
export interface BarGeometry {
  /** Where zero stands. */
  readonly zero: number;
  readonly start: number;
  readonly length: number;
  readonly below: boolean;
}

/** Places a value between the least and greatest of its column, which include zero. */
export function barGeometry(
  value: number,
  reach: { readonly low: number; readonly high: number },
): BarGeometry {
  const span = reach.high - reach.low || 1;
  const zero = (-reach.low / span) * 100;
  const length = (Math.abs(value) / span) * 100;
  return { zero, start: value < 0 ? zero - length : zero, length, below: value < 0 };
}
