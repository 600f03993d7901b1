import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { chainLadder, type ChainLadder, type Projection } from '#shared/stats/chain-ladder';
import type { PaidTriangle } from './paid-claims';

/** Paid, expected in the end and still to come, in whole cents (rule 19). */
export type ProjectedCents = WarrantyAnswer['total'];

/** What a triangle of payments leads to. */
export interface ProjectedPayments {
  /** Undefined where no half-year was over on the evaluation day. */
  ladder: ChainLadder | undefined;
  byCohort: ReadonlyMap<string, ProjectedCents>;
  total: ProjectedCents;
}

/** Carries payments on to their end; cents are rounded by cohort, and the total is that of the rounded cohorts. */
export function projectPayments({ cohorts, rows }: PaidTriangle): ProjectedPayments {
  const ladder = chainLadder(rows);
  const byCohort = new Map(
    cohorts.map((cohort, row) => [cohort, inCents(ladder?.origins[row] as Projection)]),
  );
  const sum = (figure: 'latestCents' | 'ultimateCents' | 'outstandingCents'): number =>
    [...byCohort.values()].reduce((all, cents) => all + cents[figure], 0);
  return {
    ladder,
    byCohort,
    total: {
      latestCents: sum('latestCents'),
      ultimateCents: sum('ultimateCents'),
      outstandingCents: sum('outstandingCents'),
      standardErrorCents: centsOrNull(ladder?.total.standardError),
    },
  };
}

/** The triangle with the sums that its factors are made of. */
export function toldTriangle(
  { cohorts, rows }: PaidTriangle,
  ladder: ChainLadder | undefined,
): WarrantyAnswer['triangle'] {
  return {
    rows: cohorts.map((cohort, row) => ({ cohort, cumulativeCents: [...(rows[row] ?? [])] })),
    factors: (ladder?.factors ?? []).map(({ from, to, factor, sigmaSquared }, development) => ({
      development,
      fromCents: from,
      toCents: to,
      factor,
      sigmaSquared: sigmaSquared ?? null,
    })),
  };
}

/** Rounded half up, as money is; null where there is nothing to round. */
export function centsOrNull(amount: number | undefined): number | null {
  return amount === undefined ? null : halfUp(amount);
}

function inCents({ latest, outstanding, standardError }: Projection): ProjectedCents {
  const outstandingCents = halfUp(outstanding);
  return {
    latestCents: latest,
    ultimateCents: latest + outstandingCents,
    outstandingCents,
    standardErrorCents: centsOrNull(standardError),
  };
}

function halfUp(amount: number): number {
  return Math.floor(amount + 0.5);
}
