/** From one age to the next over all origins that have both: `factor = to / from`, and Mack's sigma² of it. */
export interface DevelopmentFactor {
  /** Sum at the younger age. */
  from: number;
  /** Sum of the same origins one age later. */
  to: number;
  factor: number;
  sigmaSquared?: number;
}

/**
 * Volume-weighted factors of a triangle of cumulative amounts, one fewer than its rows. A factor over a sum of 0 is 1 and has
 * no sigma². Origins with 0 at the younger age are left out of sigma² and of its degrees of freedom (rule 19). The last sigma²,
 * for which one origin is not enough, is the least of the two before it and of their ratio, as Mack chose in 1993.
 *
 * Source: T. Mack, "Distribution-free calculation of the standard error of chain ladder reserve estimates", ASTIN Bulletin 23
 * (1993) 213–225.
 */
export function developmentFactors(triangle: readonly (readonly number[])[]): DevelopmentFactor[] {
  const factors: DevelopmentFactor[] = [];
  for (let age = 0; age + 1 < triangle.length; age += 1) {
    const steps = triangle
      .slice(0, triangle.length - 1 - age)
      .map((row) => ({ before: row[age] as number, after: row[age + 1] as number }));
    const from = steps.reduce((sum, { before }) => sum + before, 0);
    const to = steps.reduce((sum, { after }) => sum + after, 0);
    const factor = from === 0 ? 1 : to / from;
    const sigmaSquared =
      age + 2 < triangle.length ? scatter(steps, factor) : lastSigmaSquared(factors, from);
    factors.push({ from, to, factor, ...(sigmaSquared === undefined ? {} : { sigmaSquared }) });
  }
  return factors;
}

function scatter(
  steps: readonly { before: number; after: number }[],
  factor: number,
): number | undefined {
  const told = steps.filter(({ before }) => before > 0);
  if (told.length < 2) return undefined;
  const squares = told.reduce(
    (sum, { before, after }) => sum + before * (after / before - factor) ** 2,
    0,
  );
  return squares / (told.length - 1);
}

function lastSigmaSquared(factors: readonly DevelopmentFactor[], from: number): number | undefined {
  const [older, old] = factors.slice(-2).map((one) => one.sigmaSquared);
  if (from === 0 || older === undefined || old === undefined) return undefined;
  // With no scatter two ages before, the least is 0, whatever their ratio would be.
  return older === 0 ? 0 : Math.min((old * old) / older, older, old);
}
