import { normalQuantile } from './normal-distribution';

const Z = -normalQuantile(0.025);

/** One stratum of two groups: how many in each, and how many of them are cases. */
export interface RiskStratum {
  exposedCases: number;
  exposedTotal: number;
  unexposedCases: number;
  unexposedTotal: number;
}

/** How many times as likely a case is among the exposed, with its 95 % interval. */
export interface PooledRiskRatio {
  riskRatio: number;
  lower: number;
  upper: number;
}

/**
 * The risk ratio pooled over strata. A stratum with nobody in one of its groups adds nothing. `undefined` where either group
 * has no case in any stratum that adds something.
 *
 * Source: N. Mantel and W. Haenszel, J. Natl. Cancer Inst. 22 (1959) 719–748; variance of its logarithm by S. Greenland and
 * J. M. Robins, "Estimation of a common effect parameter from sparse follow-up data", Biometrics 41 (1985) 55–68.
 */
export function pooledRiskRatio(strata: readonly RiskStratum[]): PooledRiskRatio | undefined {
  let exposed = 0;
  let unexposed = 0;
  let spread = 0;
  for (const stratum of strata) {
    requireStratum(stratum);
    const { exposedCases, exposedTotal, unexposedCases, unexposedTotal } = stratum;
    const everyone = exposedTotal + unexposedTotal;
    if (everyone === 0) continue;
    const cases = exposedCases + unexposedCases;
    exposed += (exposedCases * unexposedTotal) / everyone;
    unexposed += (unexposedCases * exposedTotal) / everyone;
    spread +=
      (cases * exposedTotal * unexposedTotal) / everyone ** 2 -
      (exposedCases * unexposedCases) / everyone;
  }
  if (exposed === 0 || unexposed === 0) return undefined;
  const riskRatio = exposed / unexposed;
  // 0 where everyone is a case: with millions of them rounding would make it negative.
  const reach = Z * Math.sqrt(Math.max(0, spread) / (exposed * unexposed));
  return {
    riskRatio,
    lower: riskRatio * Math.exp(-reach),
    upper: riskRatio * Math.exp(reach),
  };
}

function requireStratum(stratum: RiskStratum): void {
  const { exposedCases, exposedTotal, unexposedCases, unexposedTotal } = stratum;
  if (!isPart(exposedCases, exposedTotal) || !isPart(unexposedCases, unexposedTotal)) {
    throw new RangeError('cases must be whole numbers from 0 to those in the group');
  }
}

function isPart(part: number, whole: number): boolean {
  return Number.isSafeInteger(part) && Number.isSafeInteger(whole) && part >= 0 && part <= whole;
}
