import { concaveRoot, FARTHEST } from './concave-root';
import { incompleteGamma } from './incomplete-gamma';
import { logGamma } from './log-gamma';
import { normalQuantile } from './normal-distribution';

/**
 * The quantile of the gamma distribution of a shape and scale 1: the x that a share p of it lies below. Chi-square with k
 * degrees of freedom is twice that of shape k/2. p 0 gives 0, p 1 ∞; what lies below e^−700 is 0.
 *
 * Source: start from E. B. Wilson and M. M. Hilferty, "The distribution of chi-square", PNAS 17 (1931) 684–688, or, far
 * down, from the first term of the series; then Newton's iteration on the logarithm of the smaller tail over ln x.
 */
export function gammaQuantile(p: number, shape: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`p must be 0 to 1, got ${p}`);
  if (!(shape > 0 && shape < Infinity))
    throw new RangeError(`shape must be positive, got ${shape}`);
  if (p === 0) return 0;
  if (p === 1) return Infinity;
  const tail = p <= 0.5 ? 'lower' : 'upper';
  const wanted = tail === 'lower' ? Math.log(p) : Math.log1p(-p);
  const sign = tail === 'lower' ? 1 : -1;
  const root = concaveRoot(
    (logX) => {
      const tails = incompleteGamma(shape, Math.exp(logX));
      return { value: tails[tail] - wanted, slope: sign * Math.exp(tails.density - tails[tail]) };
    },
    roughLog(p, shape),
  );
  return root <= -FARTHEST ? 0 : Math.exp(root);
}

function roughLog(p: number, shape: number): number {
  const cubeRoot = 1 - 1 / (9 * shape) + normalQuantile(p) / (3 * Math.sqrt(shape));
  if (shape >= 1 && cubeRoot > 0.2) return Math.log(shape) + 3 * Math.log(cubeRoot);
  return Math.min(Math.log(shape + 1), (Math.log(p) + logGamma(shape + 1)) / shape);
}
