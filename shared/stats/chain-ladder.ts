import { developmentFactors, type DevelopmentFactor } from './development-factors';

/** What one origin, or all together, has come to, will come to, and what is still to come. */
export interface Projection {
  latest: number;
  ultimate: number;
  outstanding: number;
  /** Absent where any sigma² is not defined. */
  standardError?: number;
}

/** A triangle carried on to its end: the factors used, each origin oldest first, and their total. */
export interface ChainLadder {
  factors: DevelopmentFactor[];
  origins: Projection[];
  total: Projection;
}

/**
 * The chain ladder over a triangle of cumulative amounts, with standard errors that need no distribution. Row i, oldest first,
 * has n − i values. No tail: nothing is added beyond the oldest row's age. `undefined` for an empty triangle. With fewer than
 * four rows, or where any sigma² is not defined, no standard error (rule 19).
 *
 * Source: T. Mack, "Distribution-free calculation of the standard error of chain ladder reserve estimates", ASTIN Bulletin 23
 * (1993) 213–225: theorem 3 for one origin, its corollary for the total.
 */
export function chainLadder(triangle: readonly (readonly number[])[]): ChainLadder | undefined {
  if (triangle.length === 0) return undefined;
  requireTriangle(triangle);
  const ladder = { factors: developmentFactors(triangle) };
  const origins = triangle.map((row) => {
    const age = row.length - 1;
    const latest = row[age] as number;
    const ultimate = latest * growthFrom(age, ladder);
    return withError(
      { latest, ultimate, outstanding: ultimate - latest },
      originError(latest, age, ladder),
    );
  });
  const sum = (figure: 'latest' | 'ultimate' | 'outstanding') =>
    origins.reduce((all, origin) => all + origin[figure], 0);
  const total = {
    latest: sum('latest'),
    ultimate: sum('ultimate'),
    outstanding: sum('outstanding'),
  };
  return { ...ladder, origins, total: withError(total, totalError(origins, ladder)) };
}

/**
 * Mack's standard error of one origin that has come to `latest` at an age (0: its first value), by the ladder's factors,
 * sigma² and column sums: also for a part of a row, as rule 51 asks. `undefined` where the ladder has an undefined sigma².
 */
export function originError(
  latest: number,
  age: number,
  ladder: Pick<ChainLadder, 'factors'>,
): number | undefined {
  if (!areErrorsDefined(ladder)) return undefined;
  const growth = growthFrom(age, ladder);
  let square = 0;
  // Grown step by step from `latest`, so that an origin with nothing yet needs no division by 0.
  let reached = 1;
  for (const { from, factor, sigmaSquared } of ladder.factors.slice(age)) {
    const own = (latest * growth * growth) / reached;
    const all = (latest * growth) ** 2 / from;
    square += ((sigmaSquared as number) / factor ** 2) * (own + all);
    reached *= factor;
  }
  return Math.sqrt(square);
}

/** The corollary: the origins' own errors, and what they share because they use the same factors. */
function totalError(origins: readonly Projection[], ladder: Pick<ChainLadder, 'factors'>) {
  if (!areErrorsDefined(ladder)) return undefined;
  let square = 0;
  let younger = 0;
  for (let row = origins.length - 1; row >= 0; row -= 1) {
    const { ultimate, standardError = 0 } = origins[row] as Projection;
    const age = origins.length - 1 - row;
    const shared = ladder.factors
      .slice(age)
      .reduce(
        (sum, one) => sum + (2 * (one.sigmaSquared as number)) / one.factor ** 2 / one.from,
        0,
      );
    square += standardError ** 2 + ultimate * younger * shared;
    younger += ultimate;
  }
  return Math.sqrt(square);
}

/** How many times what was reached at an age is expected in the end. */
function growthFrom(age: number, ladder: Pick<ChainLadder, 'factors'>): number {
  return ladder.factors.slice(age).reduce((product, { factor }) => product * factor, 1);
}

/** With fewer than four rows the last sigma² already has too little before it, unless there is no factor at all. */
function areErrorsDefined({ factors }: Pick<ChainLadder, 'factors'>): boolean {
  return factors.length > 0 && factors.every((one) => one.sigmaSquared !== undefined);
}

function withError(figures: Projection, standardError: number | undefined): Projection {
  return standardError === undefined ? figures : { ...figures, standardError };
}

function requireTriangle(triangle: readonly (readonly number[])[]): void {
  for (const [index, row] of triangle.entries()) {
    if (row.length !== triangle.length - index) {
      throw new RangeError(
        `row ${index} must have ${triangle.length - index} values, got ${row.length}`,
      );
    }
    for (const value of row) {
      if (!(value >= 0 && value < Infinity)) {
        throw new RangeError(`an amount must be 0 or more, got ${value}`);
      }
    }
  }
}
