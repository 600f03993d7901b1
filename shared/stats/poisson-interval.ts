import { gammaQuantile } from './gamma-quantile';

/** The limits of a Poisson mean; `lower` is 0 for a count of 0. */
export interface PoissonInterval {
  lower: number;
  upper: number;
}

/**
 * The exact interval of the mean behind a count of rare events. The caller divides by the exposure for a rate, by the expected
 * count for observed against expected.
 *
 * Source: F. Garwood, "Fiducial limits for the Poisson distribution", Biometrika 28 (1936) 437–442.
 */
export function poissonInterval(count: number, level = 0.95): PoissonInterval {
  if (!Number.isSafeInteger(count) || count < 0) {
    throw new RangeError(`a count must be a whole number, 0 or more, got ${count}`);
  }
  if (!(level > 0 && level < 1)) {
    throw new RangeError(`level must be between 0 and 1, got ${level}`);
  }
  const tail = (1 - level) / 2;
  return {
    lower: count === 0 ? 0 : gammaQuantile(tail, count),
    upper: gammaQuantile(1 - tail, count + 1),
  };
}
