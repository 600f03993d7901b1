import { requireFinite } from './require-finite';

/** A random amount's mean and variance. */
export interface MeanAndVariance {
  mean: number;
  variance: number;
}

/**
 * Mean and variance of the sum of a random number of independent amounts of one kind, the number independent of the amounts:
 * the mean is E[N]·E[X], the variance E[N]·Var[X] + Var[N]·E[X]². For a Poisson number, whose variance is its mean, that is
 * E[N]·E[X²].
 *
 * Source: S. A. Klugman, H. H. Panjer and G. E. Willmot, "Loss Models: From Data to Decisions", the chapter on aggregate
 * loss models; R. Kaas et al., "Modern Actuarial Risk Theory", the chapter on the collective risk model.
 */
export function compoundSum(count: MeanAndVariance, amount: MeanAndVariance): MeanAndVariance {
  for (const { mean, variance } of [count, amount]) {
    requireFinite(mean, 'mean');
    if (requireFinite(variance, 'variance') < 0) throw new RangeError('a variance is not negative');
  }
  if (count.mean < 0) throw new RangeError(`a number of amounts is not negative: ${count.mean}`);
  return {
    mean: count.mean * amount.mean,
    variance: count.mean * amount.variance + count.variance * amount.mean * amount.mean,
  };
}
