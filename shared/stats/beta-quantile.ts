import { concaveRoot, FARTHEST } from './concave-root';
import { incompleteBeta } from './incomplete-beta';
import { logGamma } from './log-gamma';
import { normalQuantile } from './normal-distribution';

/**
 * The quantile of the beta distribution of two shapes: the share that a share p of it lies below. p 0 gives 0, p 1 gives 1;
 * what lies below e^−700 is 0, and what a double cannot tell from 1 is 1.
 *
 * Source: start from the normal approximation of the log-odds or, for shapes below 1, from the first term of the series
 * (M. Abramowitz and I. A. Stegun (1964), 26.5.4); then Newton's iteration on the logarithm of the smaller tail over the
 * log-odds.
 */
export function betaQuantile(p: number, a: number, b: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`p must be 0 to 1, got ${p}`);
  for (const shape of [a, b]) {
    if (!(shape > 0 && shape < Infinity))
      throw new RangeError(`a shape must be positive: ${shape}`);
  }
  if (p === 0 || p === 1) return p;
  const tail = p <= 0.5 ? 'lower' : 'upper';
  const wanted = tail === 'lower' ? Math.log(p) : Math.log1p(-p);
  const sign = tail === 'lower' ? 1 : -1;
  const root = concaveRoot(
    (odds) => {
      const tails = incompleteBeta(a, b, shareOf(odds), shareOf(-odds));
      return { value: tails[tail] - wanted, slope: sign * Math.exp(tails.density - tails[tail]) };
    },
    roughOdds(p, a, b),
  );
  return root <= -FARTHEST ? 0 : shareOf(root);
}

function shareOf(logOdds: number): number {
  return 1 / (1 + Math.exp(-logOdds));
}

function roughOdds(p: number, a: number, b: number): number {
  if (a >= 1 && b >= 1) return Math.log(a / b) + normalQuantile(p) * Math.sqrt(1 / a + 1 / b);
  const logBeta = logGamma(a) + logGamma(b) - logGamma(a + b);
  const fromBelow = (Math.log(p) + Math.log(a) + logBeta) / a;
  const fromAbove = -(Math.log1p(-p) + Math.log(b) + logBeta) / b;
  if (fromBelow < 0) return fromBelow;
  return Math.max(0, fromAbove);
}
