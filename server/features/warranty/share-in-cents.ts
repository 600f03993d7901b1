/**
 * Shares whole cents out by weight so that they add up to the sum: each gets its share rounded down, and the cents that are
 * left go to the largest remainders, the first of equal ones first. Rounding each share by itself could miss the sum by a few
 * cents. Without any weight there is nothing to share by, and everyone gets 0. Exact for any amounts.
 */
export function shareInCents(sumCents: number, weights: readonly number[]): number[] {
  const whole = weights.reduce((all, weight) => all + BigInt(weight), 0n);
  if (whole === 0n) return weights.map(() => 0);
  const parts = weights.map((weight) => BigInt(sumCents) * BigInt(weight));
  const shares = parts.map((part) => Number(part / whole));
  const left = sumCents - shares.reduce((all, share) => all + share, 0);
  const byRemainder = parts
    .map((part, index) => ({ index, remainder: part % whole }))
    .sort((one, other) => Number(other.remainder - one.remainder) || one.index - other.index);
  for (const { index } of byRemainder.slice(0, left)) shares[index]! += 1;
  return shares;
}
