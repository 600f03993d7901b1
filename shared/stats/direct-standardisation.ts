import { compensatedSum } from './compensated-sum';
import { gammaQuantile } from './gamma-quantile';

/** A rate adjusted to a standard population, with its interval; `upper` may exceed 1. */
export interface StandardisedRate {
  rate: number;
  lower: number;
  upper: number;
}

/**
 * The rate that the standard population would have with this group's rates band by band, with its gamma interval. Never
 * clamped: for a share the caller limits `upper` to 1 (rule 35). Bands in which the group has nobody are the caller's to
 * drop. Without events the lower limit is 0; one band alone gives Garwood's exact Poisson interval. `undefined` without a
 * band, or when the standard has nobody in any.
 *
 * Source: M. P. Fay and E. J. Feuer, "Confidence intervals for directly standardized rates: a method based on the gamma
 * distribution", Statistics in Medicine 16 (1997) 791–801.
 */
export function directlyStandardised(
  events: ArrayLike<number>,
  sizes: ArrayLike<number>,
  standard: ArrayLike<number>,
  level = 0.95,
): StandardisedRate | undefined {
  if (!(level > 0 && level < 1)) throw new RangeError(`level must be between 0 and 1: ${level}`);
  requireBands(events, sizes, standard);
  const whole = compensatedSum(standard);
  if (!(whole > 0)) return undefined;
  const perHead = Array.from(standard, (weight, band) => weight / whole / (sizes[band] as number));
  const countOf = (band: number) => events[band] as number;
  const rate = compensatedSum(perHead.map((weight, band) => weight * countOf(band)));
  const variance = compensatedSum(perHead.map((weight, band) => weight * weight * countOf(band)));
  // One more event where it weighs most: what the upper limit allows for.
  const most = perHead.reduce((largest, weight) => Math.max(largest, weight), 0);
  const tail = (1 - level) / 2;
  return {
    rate,
    lower: rate === 0 ? 0 : gammaLimit(tail, rate, variance),
    upper: gammaLimit(1 - tail, rate + most, variance + most * most),
  };
}

/** The quantile of the gamma distribution with this mean and variance. */
function gammaLimit(p: number, mean: number, variance: number): number {
  return (gammaQuantile(p, (mean * mean) / variance) * variance) / mean;
}

function requireBands(
  events: ArrayLike<number>,
  sizes: ArrayLike<number>,
  standard: ArrayLike<number>,
): void {
  if (events.length !== sizes.length || events.length !== standard.length) {
    throw new RangeError('events, sizes and standard must be lists of equal length');
  }
  for (let band = 0; band < events.length; band += 1) {
    const [count, size, weight] = [events[band], sizes[band], standard[band]];
    if (!isAmount(count)) throw new RangeError(`events must be 0 or more, got ${count}`);
    if (!isAmount(size) || size === 0) throw new RangeError(`a size must be above 0, got ${size}`);
    if (!isAmount(weight)) throw new RangeError(`a weight must be 0 or more, got ${weight}`);
  }
}

function isAmount(value: number | undefined): value is number {
  return value !== undefined && value >= 0 && value < Infinity;
}
