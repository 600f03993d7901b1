import { chiSquareUpperTail } from './chi-square';
import { quadraticForm } from './quadratic-form';
import { requireStep, type RiskStep } from './risk-step';

/** A test of whether groups differ in how soon the event comes, with the sums it is made of, a group each. */
export interface LogRank {
  chiSquare: number;
  degreesOfFreedom: number;
  p: number;
  groups: { observed: number; expected: number }[];
}

/**
 * The log-rank test: events observed and expected in each group, step by step, with the hypergeometric variance and no
 * continuity correction. Steps stand for the same moments in every group; a group whose steps end earlier has nobody at risk
 * after. A group that never had anybody at risk at an event takes no part. `undefined` with fewer than two groups that do, or
 * where the groups were never at risk together.
 *
 * Source: N. Mantel, Cancer Chemotherapy Reports 50 (1966) 163–170; R. Peto and J. Peto, JRSS A 135 (1972) 185–206; variance
 * as in J. D. Kalbfleisch and R. L. Prentice, "The Statistical Analysis of Failure Time Data" (1980), 1.4.
 */
export function logRank(groups: readonly (readonly RiskStep[])[]): LogRank | undefined {
  const sums = groups.map(() => ({ observed: 0, expected: 0 }));
  const variance = groups.map(() => groups.map(() => 0));
  const length = groups.reduce((longest, steps) => Math.max(longest, steps.length), 0);
  for (let index = 0; index < length; index += 1) {
    addStep(
      groups.map((steps) => steps[index] ?? { atRisk: 0, events: 0 }),
      sums,
      variance,
    );
  }
  const taking = sums.flatMap(({ expected }, index) => (expected > 0 ? [index] : []));
  // The differences add up to 0: one group's follow from the others'.
  const kept = taking.slice(0, -1);
  if (kept.length === 0) return undefined;
  const chiSquare = quadraticForm(
    kept.map((row) => kept.map((column) => variance[row]?.[column] as number)),
    kept.map((row) => differenceOf(sums[row])),
  );
  if (chiSquare === undefined) return undefined;
  const degreesOfFreedom = kept.length;
  return {
    chiSquare,
    degreesOfFreedom,
    p: chiSquareUpperTail(chiSquare, degreesOfFreedom),
    groups: sums,
  };
}

function addStep(
  steps: readonly RiskStep[],
  sums: LogRank['groups'],
  variance: readonly number[][],
): void {
  for (const { atRisk, events } of steps) requireStep(atRisk, events);
  const atRisk = steps.reduce((sum, step) => sum + step.atRisk, 0);
  const events = steps.reduce((sum, step) => sum + step.events, 0);
  if (events === 0) return;
  const shares = steps.map((step) => step.atRisk / atRisk);
  // One alone at risk leaves nothing to chance.
  const spread = atRisk > 1 ? (events * (atRisk - events)) / (atRisk - 1) : 0;
  shares.forEach((share, row) => {
    const sum = sums[row] as LogRank['groups'][number];
    sum.observed += steps[row]?.events ?? 0;
    sum.expected += events * share;
    const variances = variance[row] as number[];
    shares.forEach((other, column) => {
      variances[column] =
        (variances[column] ?? 0) + spread * share * ((row === column ? 1 : 0) - other);
    });
  });
}

function differenceOf(sums: LogRank['groups'][number] | undefined): number {
  return sums ? sums.observed - sums.expected : 0;
}
