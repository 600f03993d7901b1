/** An estimate with the interval about it; the limits need not lie equally far. */
export interface Estimate {
  value: number;
  lower: number;
  upper: number;
}

/**
 * The difference of two independent estimates (first − second) with the interval that their own intervals recover: each limit's
 * distance is the root of the squared distances that pull it. Of two Wilson intervals it is Newcombe's hybrid score interval.
 *
 * Source: R. G. Newcombe, "Interval estimation for the difference between independent proportions", Statistics in Medicine 17
 * (1998) 873–890, method 10; G. Y. Zou and A. Donner, Statistics in Medicine 27 (2008) 1693–1702, for any two estimates.
 */
export function differenceInterval(first: Estimate, second: Estimate): Estimate {
  const value = first.value - second.value;
  return {
    value,
    lower: value - Math.hypot(first.value - first.lower, second.upper - second.value),
    upper: value + Math.hypot(first.upper - first.value, second.value - second.lower),
  };
}
