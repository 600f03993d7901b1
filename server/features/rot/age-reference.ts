import type { NetworkReference } from '#db/network-reference';
import type { JobFilters } from '#db/queries/job-filters';
import type { RotAnswer } from '#shared/contracts/rot';
import { shareOf } from '#shared/domain/small-samples';
import { AGE_BANDS } from '#shared/domain/vocabulary';

/** What regions are compared with: an age mix, and the share with rot of each band. */
export interface AgeReference {
  kind: RotAnswer['reference'];
  /** Cars a band: the weights of the adjusted shares (rule 35). */
  cars: readonly number[];
  /** Share with rot a band; null where too little stands behind it. */
  shares: readonly (number | null)[];
}

/** The whole network where the caller may know of it, else all branches that the caller sees (rule 21). */
export function ageReference(network: NetworkReference, filters: JobFilters): AgeReference {
  const { kind, bands } = network.rotBands(filters);
  const byBand = AGE_BANDS.map((_, place) => bands.find(({ band }) => band === place));
  return {
    kind,
    cars: byBand.map((band) => band?.cars ?? 0),
    shares: byBand.map((band) =>
      band?.enoughBehind ? shareOf(band.withRot, band.cars).share : null,
    ),
  };
}
