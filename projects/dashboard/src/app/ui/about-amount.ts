/** Half of a 95 % interval in standard errors. */
const Z95 = 1.959964;

/** An estimate of money and half of its 95 % interval, both in minor units and with no more digits than the interval bears. */
export interface AboutAmount {
  readonly cents: number;
  /** Give or take; null where nothing can be said of it. */
  readonly reachCents: number | null;
}

/** Half of the 95 % interval, "give or take", of an estimate with this standard error. */
export function giveOrTakeCents(standardErrorCents: number): number {
  return Z95 * standardErrorCents;
}

/**
 * An estimate as it may be said in a sentence: give or take with one or two digits, the figure to the same place. The change from
 * two digits to one lies where that of the Particle Data Group lies, at 355 (Review of Particle Physics, introduction).
 */
export function aboutAmount(cents: number, standardErrorCents: number | null): AboutAmount {
  if (standardErrorCents === null) return { cents: toPlace(cents, 100), reachCents: null };
  const reach = giveOrTakeCents(standardErrorCents);
  const place = Math.max(100, placeOf(reach));
  return { cents: toPlace(cents, place), reachCents: toPlace(reach, place) };
}

/** The place to which a spread is said: its second digit where it begins with 100 to 354, else its first. */
function placeOf(reach: number): number {
  if (reach <= 0) return 0;
  const first = 10 ** Math.floor(Math.log10(reach));
  return reach / first < 3.55 ? first / 10 : first;
}

function toPlace(cents: number, place: number): number {
  return Math.round(cents / place) * place;
}
