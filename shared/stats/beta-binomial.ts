import { betaQuantile } from './beta-quantile';
import { betaBinomialProfile } from './beta-binomial-profile';
import { risingRoot } from './rising-root';

/** A beta distribution of the groups' true shares. */
export interface BetaFit {
  alpha: number;
  beta: number;
}

/** A group's share drawn towards the others', with its central 95 % interval, all 0 … 1. */
export interface ShrunkShare {
  share: number;
  lower: number;
  upper: number;
}

/** Where a spread is searched: ln of 1/(α + β), in steps of a factor of 4 from next to none to nearly all-or-none. */
const SPREADS = Array.from({ length: 34 }, (_, step) => Math.log(1e-12) + step * Math.log(4));

/**
 * The beta distribution of true shares under which the groups' counts are likeliest (beta-binomial maximum likelihood).
 * `undefined` when the likelihood has no finite maximum above the binomial with one common share: fewer than two groups, all
 * or none successes, groups no more spread than chance, or every group all-or-none, where the spread grows without end
 * (rule 34: the caller pools). Groups of size 0 say nothing and are left out.
 *
 * For every spread the mean is the likeliest one (profile likelihood), so the search runs along one line; each place where
 * its slope turns from rising to falling is a candidate, and the likeliest is taken.
 *
 * Source: J. G. Skellam, "A probability distribution derived from the binomial distribution by regarding the probability of
 * success as variable between the sets of trials", JRSS B 10 (1948) 257–261; the edge at no spread as in R. E. Tarone,
 * Biometrika 66 (1979) 585–590.
 */
export function fitBetaBinomial(
  successes: ArrayLike<number>,
  sizes: ArrayLike<number>,
): BetaFit | undefined {
  const profile = betaBinomialProfile(successes, sizes);
  if (profile === undefined) return undefined;
  let best: { fit: BetaFit; gain: number } | undefined;
  let [before, risingBefore] = [Number.NaN, false];
  for (const spread of SPREADS) {
    const isRising = profile.slope(spread) > 0;
    if (risingBefore && !isRising) {
      const peak = risingRoot((at) => -profile.slope(at), [before, spread]);
      const gain = profile.gain(peak);
      if (gain > (best?.gain ?? 0)) best = { fit: profile.shapesAt(peak), gain };
    }
    [before, risingBefore] = [spread, isRising];
  }
  return best?.fit;
}

/**
 * The share of a group with y of n given the fit of all groups: mean and 2.5 and 97.5 % quantiles of Beta(α + y, β + n − y).
 *
 * Source: A. Gelman et al., "Bayesian Data Analysis", 3rd edition, sections 2.4 and 5.1 (empirical Bayes).
 */
export function shrunkShare(fit: BetaFit, y: number, n: number): ShrunkShare {
  if (!(y >= 0 && y <= n && n < Infinity))
    throw new RangeError(`not a count of a size: ${y} of ${n}`);
  const [a, b] = [fit.alpha + y, fit.beta + n - y];
  return { share: a / (a + b), lower: betaQuantile(0.025, a, b), upper: betaQuantile(0.975, a, b) };
}
