import { formatAmount, formatMoney } from '../../ui/format';

/** A sum of money in words no finer than what is known of it. */
export interface RoundedMoney {
  /** "€77,000". */
  readonly sum: string;
  /** "14,000", without the currency; null where the interval is not known. */
  readonly giveOrTake: string | null;
}

/**
 * Rounds a sum and half of its interval (both in minor units) to two figures of the latter; without it the sum to two figures of its
 * own. Never finer than whole units of the currency.
 */
export function roundedMoney(
  cents: number,
  giveOrTakeCents: number | null,
  currency: string,
): RoundedMoney {
  const unit = twoFigures(giveOrTakeCents ?? cents);
  const round = (amount: number): number => Math.round(amount / unit) * unit;
  return {
    sum: formatMoney(round(cents), currency),
    giveOrTake: giveOrTakeCents === null ? null : formatAmount(round(giveOrTakeCents)),
  };
}

/** The unit, in minor units, to which an amount has two figures. */
function twoFigures(cents: number): number {
  const whole = Math.abs(cents) / 100;
  return whole < 10 ? 100 : 100 * 10 ** (Math.floor(Math.log10(whole)) - 1);
}
