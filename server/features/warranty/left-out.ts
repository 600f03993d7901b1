import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { CarClaim, CarsAsked } from './cars-asked';

/** What stands outside the figures. A refused claim is told as such, whether its car was still under warranty or not. */
export function leftOut(
  { asOf, covers, claims }: CarsAsked,
  evaluatedOn: string,
): WarrantyAnswer['left'] {
  const count = (isMeant: (claim: CarClaim) => boolean): number => claims.filter(isMeant).length;
  return {
    carsWithoutWarranty: covers.filter((cover) => cover === undefined).length,
    claimsAfterEnd: count(({ standing }) => standing === 'after_end'),
    claimsRefused: count(({ standing }) => standing === 'refused'),
    claimsWaiting: count(({ waiting }) => waiting === 1),
    paidAfterEvaluationCents: claims.reduce(
      (sum, { paidOn, costCents }) =>
        paidOn !== null && paidOn > evaluatedOn && paidOn <= asOf ? sum + costCents : sum,
      0,
    ),
  };
}
