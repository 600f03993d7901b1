import { stirlingError } from './log-gamma';
import { logShortfall } from './log-shortfall';

/** Up to here terms are added one by one. */
const FEW = 16;
/** From here on Stirling's series holds without climbing. */
const FAR = 10;

/**
 * The sum of ln(1 + j/a) over j = 0 … k − 1: how far the rising factorial a(a + 1)…(a + k − 1) exceeds aᵏ, as a logarithm. Taken as
 * a difference of log-gammas it would lose every digit once a is large, which is where a beta-binomial nears a binomial.
 *
 * Source: M. Abramowitz and I. A. Stegun, "Handbook of Mathematical Functions" (1964), 6.1.22 and 6.1.41, cancelled by hand.
 */
export function logRise(a: number, k: number): number {
  if (k <= FEW) return addUp(k, (j) => Math.log1p(j / a));
  if (a < FAR) {
    return (
      addUp(FEW, (j) => Math.log1p(j / a)) +
      logRise(a + FEW, k - FEW) +
      (k - FEW) * Math.log1p(FEW / a)
    );
  }
  const ratio = k / a;
  const shortfall = logShortfall(ratio);
  // a((1 + r) ln(1 + r) − r), with ln(1 + r) = r − shortfall.
  const bulk = k * ratio - (a + k) * shortfall;
  return bulk - 0.5 * (ratio - shortfall) + stirlingError(a + k) - stirlingError(a);
}

/**
 * The sum of j/(a + j) over j = 0 … k − 1: how `logRise` falls as a grows, times −a. k less it, over a, is ψ(a + k) − ψ(a).
 *
 * Source: Abramowitz and Stegun (1964), 6.3.6 and 6.3.18, cancelled by hand.
 */
export function riseSlope(a: number, k: number): number {
  if (k <= FEW) return addUp(k, (j) => j / (a + j));
  if (a < FAR) {
    const rest = k - FEW;
    // j/(a + j) with j = FEW + i is i/(a + FEW + i) and FEW of the rest's 1/(a + FEW + i).
    const inner = riseSlope(a + FEW, rest);
    return addUp(FEW, (j) => j / (a + j)) + inner + (FEW * (rest - inner)) / (a + FEW);
  }
  const first = (0.5 * k) / (a + k);
  return a * (logShortfall(k / a) + digammaRest(a) - digammaRest(a + k)) - first;
}

/** What ln x − 1/(2x) leaves of ψ(x), for x of 10 and more. */
function digammaRest(x: number): number {
  const s = 1 / (x * x);
  return -s * (1 / 12 - s * (1 / 120 - s * (1 / 252 - s * (1 / 240 - s / 132))));
}

function addUp(k: number, term: (j: number) => number): number {
  let sum = 0;
  for (let j = 1; j < k; j += 1) sum += term(j);
  return sum;
}
