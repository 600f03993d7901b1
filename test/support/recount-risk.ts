import type { WarrantyRiskRow } from '#shared/contracts/warranty-reports';
import { chainLadder, originError } from '#shared/stats/chain-ladder';
import { poissonInterval } from '#shared/stats/poisson-interval';
import {
  againstExpected,
  countedOf,
  daysRun,
  halfYear,
  isCovered,
  lastEnd,
  triangleOf,
  type SoldCar,
} from './recount-cover';

/** The warranty-risk rows counted afresh; each branch's cost still to come within a cent of its share, and together exactly the network's. */
export function recountRisk(
  network: readonly SoldCar[],
  asOf: string,
  branches: readonly string[] | undefined,
): WarrantyRiskRow[] {
  const sold = network.filter(({ job }) => job.completedOn <= asOf);
  const evaluatedOn = lastEnd(asOf);
  const { cohorts, rows } = triangleOf(sold, evaluatedOn);
  const ladder = chainLadder(rows);
  const codes = [...new Set(sold.map(({ branch }) => branch))].sort();
  const every = [...new Set(sold.map(({ job }) => halfYear(job.completedOn)))].sort();
  return codes
    .filter((branch) => branches?.includes(branch) ?? true)
    .flatMap((branch) =>
      every.flatMap((cohort): WarrantyRiskRow[] => {
        const cars = sold.filter(
          ({ branch: at, job }) => at === branch && halfYear(job.completedOn) === cohort,
        );
        if (cars.length === 0) return [];
        const paidCents = triangleOf(cars, evaluatedOn).rows[0]?.at(-1) ?? 0;
        const row = cohorts.indexOf(cohort);
        const origin = ladder?.origins[row];
        const age = cohorts.length - 1 - row;
        const error = origin && originError(paidCents, age, ladder);
        const counted = countedOf(cars, asOf);
        const carYearsRun = daysRun(cars, asOf) / 365.25;
        const { lower, upper } = poissonInterval(counted.length);
        const rate = (count: number) => (carYearsRun === 0 ? null : (count / carYearsRun) * 1000);
        const { expected, ratio } = againstExpected(cars, sold, asOf);
        return [
          {
            ...{ branch, cohort, carsCovered: cars.filter(isCovered).length, carYearsRun },
            carYearsLeft: (daysRun(cars, '2999-12-31') - daysRun(cars, asOf)) / 365.25,
            ...{ claims: counted.length, paidCents, per1000: rate(counted.length) },
            ...{ lower: rate(lower), upper: rate(upper), expected, ratio },
            outstandingCents: origin ? aboutCents(paidCents * shareToCome(origin)) : null,
            standardErrorCents: error === undefined ? null : Math.round(error),
            claimsOpen: counted.filter(
              ({ decision, decidedOn = '' }) => decision === 'open' || decidedOn > asOf,
            ).length,
          },
        ];
      }),
    );
}

/** What the branches of each half-year add up to: the network's cost still to come, in whole cents. */
export function outstandingByCohort(
  network: readonly SoldCar[],
  asOf: string,
): Map<string, number> {
  const sold = network.filter(({ job }) => job.completedOn <= asOf);
  const { cohorts, rows } = triangleOf(sold, lastEnd(asOf));
  const ladder = chainLadder(rows);
  return new Map(
    cohorts.map((cohort, row) => [cohort, Math.round(ladder!.origins[row]!.outstanding)]),
  );
}

function shareToCome({ latest, outstanding }: { latest: number; outstanding: number }): number {
  return latest === 0 ? 0 : outstanding / latest;
}

/** A share of whole cents may be a cent more or less than its exact value. */
function aboutCents(exact: number): number {
  return {
    asymmetricMatch: (cents: number) => Number.isInteger(cents) && Math.abs(cents - exact) <= 1.5,
  } as unknown as number;
}
