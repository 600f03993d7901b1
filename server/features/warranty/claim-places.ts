import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { CLAIM_CAUSES, ZONES } from '#shared/domain/vocabulary';
import type { CarsAsked } from './cars-asked';

/** Counted claims and what they cost by cause, every cause in the vocabulary's order. */
export function claimsByCause({ claims }: CarsAsked): WarrantyAnswer['causes'] {
  const counted = claims.filter(({ standing }) => standing === 'counted');
  return CLAIM_CAUSES.map((cause) => ({
    cause,
    ...summed(counted.filter((claim) => claim.cause === cause)),
  }));
}

/** The same by zone. */
export function claimsByZone({ claims }: CarsAsked): WarrantyAnswer['zones'] {
  const counted = claims.filter(({ standing }) => standing === 'counted');
  return ZONES.map((zone) => ({
    zone,
    ...summed(counted.filter((claim) => claim.zone === zone)),
  }));
}

function summed(claims: readonly { costCents: number }[]): { claims: number; costCents: number } {
  return {
    claims: claims.length,
    costCents: claims.reduce((sum, { costCents }) => sum + costCents, 0),
  };
}
