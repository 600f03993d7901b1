import { incompleteBeta } from './incomplete-beta';
import { incompleteGamma } from './incomplete-gamma';

/** Where a funnel ends on both sides, at 95 % and at 99.8 %. */
export interface FunnelLimits {
  lower95: number;
  upper95: number;
  lower998: number;
  upper998: number;
}

/**
 * Limits of a share of `n` cars about `theta` (0 … 1): exact binomial quantiles at .001, .025, .975 and .999, interpolated between
 * counts and cut to 0 … 1. A share of 0 or 1 leaves nothing to chance: all four are that share.
 *
 * Source: D. J. Spiegelhalter, "Funnel plots for comparing institutional performance", Statistics in Medicine 24 (2005)
 * 1185–1202, appendix A.1.1.
 */
export function binomialLimits(theta: number, n: number): FunnelLimits {
  if (!(theta >= 0 && theta <= 1)) throw new RangeError(`a share is 0 to 1, not ${theta}`);
  if (!(Number.isInteger(n) && n > 0)) throw new RangeError(`a number of cars, not ${n}`);
  if (theta === 0 || theta === 1) return everywhere(() => theta);
  const upTo = (count: number): number =>
    count < 0 ? 0 : count >= n ? 1 : Math.exp(incompleteBeta(count + 1, n - count, theta).upper);
  return everywhere((p) => Math.min(1, Math.max(0, interpolated(upTo, p, n) / n)));
}

/**
 * Limits of a count about its mean: Poisson quantiles interpolated in the same way, never below 0; `undefined` for a mean of 0,
 * about which there is no funnel.
 */
export function poissonLimits(mean: number): FunnelLimits | undefined {
  if (!(mean >= 0 && Number.isFinite(mean))) throw new RangeError(`a mean count, not ${mean}`);
  if (mean === 0) return undefined;
  const upTo = (count: number): number =>
    count < 0 ? 0 : Math.exp(incompleteGamma(count + 1, mean).upper);
  // Above this no count of the mean is as rare as one in a thousand.
  const most = Math.ceil(mean + 10 * Math.sqrt(mean) + 20);
  return everywhere((p) => Math.max(0, interpolated(upTo, p, most)));
}

function everywhere(limit: (p: number) => number): FunnelLimits {
  return {
    lower95: limit(0.025),
    upper95: limit(0.975),
    lower998: limit(0.001),
    upper998: limit(0.999),
  };
}

/** r − (F(r) − p) / (F(r) − F(r − 1)) for the smallest r whose distribution function reaches p. */
function interpolated(upTo: (count: number) => number, p: number, most: number): number {
  let low = 0;
  let high = most;
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (upTo(middle) >= p) high = middle;
    else low = middle + 1;
  }
  const reached = upTo(low);
  return low - (reached - p) / (reached - upTo(low - 1));
}
