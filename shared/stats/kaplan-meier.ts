import { normalQuantile } from './normal-distribution';
import { requireStep, type RiskStep } from './risk-step';

const Z = -normalQuantile(0.025);

/** The share without the event after a step. No spread where the share is 0; no limits where it is 1 or 0. */
export interface SurvivalStep {
  survival: number;
  standardError?: number;
  lower?: number;
  upper?: number;
}

/**
 * The product-limit estimate, one answer a step, with Greenwood's standard error and the 95 % limits on the log-log scale. At
 * a share of 1 that scale has no limits, and limits of 1 and 1 would claim a certainty that no count of cars gives; at 0 the
 * standard error is not defined either.
 *
 * Source: E. L. Kaplan and P. Meier, "Nonparametric estimation from incomplete observations", JASA 53 (1958) 457–481;
 * M. Greenwood (1926); limits as in J. D. Kalbfleisch and R. L. Prentice, "The Statistical Analysis of Failure Time Data"
 * (1980), 1.3.
 */
export function kaplanMeier(steps: readonly RiskStep[]): SurvivalStep[] {
  let survival = 1;
  let spread = 0;
  return steps.map(({ atRisk, events }) => {
    requireStep(atRisk, events);
    if (events > 0) {
      survival *= (atRisk - events) / atRisk;
      spread += events / (atRisk * (atRisk - events));
    }
    return told(survival, Math.sqrt(spread));
  });
}

function told(survival: number, relativeError: number): SurvivalStep {
  if (survival === 0) return { survival };
  const standardError = survival * relativeError;
  if (survival === 1) return { survival, standardError };
  const reach = (Z * relativeError) / -Math.log(survival);
  return {
    survival,
    standardError,
    lower: survival ** Math.exp(reach),
    upper: survival ** Math.exp(-reach),
  };
}
