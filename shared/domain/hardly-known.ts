import { giveOrTake } from './give-or-take';

interface Estimated {
  outstandingCents: number;
  standardErrorCents: number | null;
}

/**
 * The half-year that makes a sum still to come as uncertain as it is, where half of the sum's 95 % interval is more than the sum
 * itself; `undefined` where the sum is known better, or its error not at all.
 */
function leastKnown<Cohort extends Estimated>(
  total: Estimated,
  cohorts: readonly Cohort[],
): Cohort | undefined {
  const { standardErrorCents, outstandingCents } = total;
  if (standardErrorCents === null || giveOrTake(standardErrorCents) <= outstandingCents) {
    return undefined;
  }
  return [...cohorts].sort((a, b) => (b.standardErrorCents ?? 0) - (a.standardErrorCents ?? 0))[0];
}

/** Says so, with what of that half-year's cost is paid; `money` writes an amount of cents. */
export function hardlyKnownWords(
  total: Estimated,
  cohorts: readonly (Estimated & { cohort: string; latestCents: number })[],
  money: (cents: number) => string,
): string | undefined {
  const least = leastKnown(total, cohorts);
  return (
    least &&
    `It can hardly be told yet, most of all for cars finished in ${least.cohort.replace('-', ' ')}: of what they will cost only ${money(least.latestCents)} is paid.`
  );
}
