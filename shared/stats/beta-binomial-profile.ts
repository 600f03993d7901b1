import { logRise, riseSlope } from './rising-factorial';
import { risingRoot } from './rising-root';

/** The beta-binomial likelihood along its spread, ln of 1/(α + β), with the likeliest mean at each. */
export interface BetaBinomialProfile {
  /** How the log-likelihood rises with the spread. */
  slope: (spread: number) => number;
  /** The log-likelihood above that of one common share. */
  gain: (spread: number) => number;
  shapesAt: (spread: number) => { alpha: number; beta: number };
}

/** How often each value occurs: groups repeat, and equal ones cost one computation. */
type Tally = readonly (readonly [value: number, times: number])[];

/**
 * The profile, or `undefined` where none has an inside: fewer than two groups, all or none successes, or every group
 * all-or-none.
 *
 * Source: the beta-binomial log-likelihood as sums over 0 … y − 1, D. A. Griffiths, Biometrics 29 (1973) 637–648.
 */
export function betaBinomialProfile(
  successes: ArrayLike<number>,
  sizes: ArrayLike<number>,
): BetaBinomialProfile | undefined {
  const groups = readGroups(successes, sizes);
  if (groups.length < 2 || groups.every(([y, n]) => y === 0 || y === n)) return undefined;
  const hits = tally(groups.map(([y]) => y));
  const misses = tally(groups.map(([y, n]) => n - y));
  const all = tally(groups.map(([, n]) => n));
  const [hitSum, missSum] = [sumOver(hits, (k) => k), sumOver(misses, (k) => k)];
  // The likeliest log-odds solve logOdds = ln(A/B), A between the groups with a success and all successes, B alike.
  const bracket = [
    Math.log(sumOver(hits, Math.sign) / missSum) - 1e-9,
    Math.log(hitSum / sumOver(misses, Math.sign)) + 1e-9,
  ] as const;
  let lastOdds = Math.log(hitSum / missSum);

  const oddsAt = (spread: number) => {
    const left = (odds: number) => {
      const { alpha, beta } = shapes(spread, odds);
      const a = hitSum - sumOver(hits, (k) => riseSlope(alpha, k));
      const b = missSum - sumOver(misses, (k) => riseSlope(beta, k));
      return odds - Math.log(a / b);
    };
    return (lastOdds = risingRoot(left, bracket, lastOdds));
  };
  return {
    shapesAt: (spread) => shapes(spread, oddsAt(spread)),
    slope: (spread) => {
      const { alpha, beta } = shapes(spread, oddsAt(spread));
      return sumOfThree(riseSlope, [alpha, beta, Math.exp(-spread)], [hits, misses, all]);
    },
    gain: (spread) => {
      const { alpha, beta } = shapes(spread, oddsAt(spread));
      const whole = alpha + beta;
      const [share, rest] = [hitSum / (hitSum + missSum), missSum / (hitSum + missSum)];
      const moved =
        hitSum * Math.log(alpha / whole / share) + missSum * Math.log(beta / whole / rest);
      return moved + sumOfThree(logRise, [alpha, beta, whole], [hits, misses, all]);
    },
  };
}

function shapes(spread: number, odds: number): { alpha: number; beta: number } {
  const whole = Math.exp(-spread);
  return { alpha: whole / (1 + Math.exp(-odds)), beta: whole / (1 + Math.exp(odds)) };
}

function sumOfThree(
  term: (a: number, k: number) => number,
  [alpha, beta, whole]: readonly [number, number, number],
  [hits, misses, all]: readonly [Tally, Tally, Tally],
): number {
  return (
    sumOver(hits, (k) => term(alpha, k)) +
    sumOver(misses, (k) => term(beta, k)) -
    sumOver(all, (k) => term(whole, k))
  );
}

function sumOver(values: Tally, term: (value: number) => number): number {
  let sum = 0;
  for (const [value, times] of values) sum += times * term(value);
  return sum;
}

function tally(values: readonly number[]): Tally {
  const times = new Map<number, number>();
  for (const value of values) times.set(value, (times.get(value) ?? 0) + 1);
  return [...times];
}

function readGroups(successes: ArrayLike<number>, sizes: ArrayLike<number>): [number, number][] {
  if (successes.length !== sizes.length) {
    throw new RangeError(`as many successes as sizes: ${successes.length} against ${sizes.length}`);
  }
  const groups = Array.from(sizes, (n, index): [number, number] => [successes[index] as number, n]);
  for (const [y, n] of groups) {
    if (!(Number.isSafeInteger(n) && Number.isSafeInteger(y) && y >= 0 && y <= n)) {
      throw new RangeError(`successes must be whole numbers from 0 to their size: ${y} of ${n}`);
    }
  }
  return groups.filter(([, n]) => n > 0);
}
