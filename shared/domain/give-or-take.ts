/** An amount and half its 95 % interval, both in cents and to the digits that the interval supports. */
export interface RoundedAmount {
  cents: number;
  /** Null without a standard error. */
  giveOrTakeCents: number | null;
}

/** 97.5 % point of the normal distribution, as rule 26 has it. */
const Z = 1.959964;
const WHOLE_MONEY = 100;

/** Half of the 95 % interval of an estimate, as counted. */
export function giveOrTake(standardErrorCents: number): number {
  return Z * standardErrorCents;
}

/**
 * An estimate as a sentence says it: give or take to two digits, the amount to the same place, neither finer than whole
 * money. Without an error the amount to two digits of its own: nothing supports more.
 */
export function roundedAmount(cents: number, standardErrorCents: number | null): RoundedAmount {
  if (standardErrorCents === null) {
    return { cents: roundTo(cents, twoDigits(cents)), giveOrTakeCents: null };
  }
  const half = giveOrTake(standardErrorCents);
  const step = twoDigits(half);
  return { cents: roundTo(cents, step), giveOrTakeCents: roundTo(half, step) };
}

/** The place, in cents, to which an amount has two digits; whole money at least. */
function twoDigits(amount: number): number {
  const digits = Math.floor(Math.log10(Math.max(Math.abs(amount), 1)));
  return Math.max(10 ** (digits - 1), WHOLE_MONEY);
}

function roundTo(value: number, step: number): number {
  return Math.round(value / step) * step;
}
