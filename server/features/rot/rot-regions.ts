import type { Climate } from '#db/queries/rot';
import type { RotRegion } from '#shared/contracts/rot';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { AGE_BANDS, type AgeBand } from '#shared/domain/vocabulary';
import { directlyStandardised } from '#shared/stats/direct-standardisation';
import { corrosionRate } from '#shared/stats/iso-corrosivity';
import { countedShare } from './count-shares';
import { sumOf, type ByBand } from './tally-cars';

/** A region's rot as it is and adjusted for age, beside how corrosive its air is. `reference` is cars a band. */
export function rotRegion(
  region: string,
  own: ByBand,
  reference: readonly number[],
  climate: Climate | undefined,
): RotRegion {
  const { cars, withRot, share } = countedShare(sumOf(own.cars), sumOf(own.withRot));
  return {
    region,
    cars,
    withRot,
    share,
    ...adjustedForAge(own, reference),
    bandsLeftOut: bandsLeftOut(own, reference),
    ...corrosion(climate),
  };
}

type Adjusted = Pick<RotRegion, 'adjustedShare' | 'adjustedLower' | 'adjustedUpper'>;

/** The share that the reference's age mix would have with this region's share of every band it has a car in (rule 35). */
function adjustedForAge(own: ByBand, reference: readonly number[]): Adjusted {
  const kept = AGE_BANDS.map((_, band) => band).filter((band) => (own.cars[band] as number) > 0);
  const pick = (values: readonly number[]): number[] => kept.map((band) => values[band] as number);
  const adjusted =
    sumOf(own.cars) < FEWEST_CARS
      ? undefined
      : directlyStandardised(pick(own.withRot), pick(own.cars), pick(reference));
  if (!adjusted) return { adjustedShare: null, adjustedLower: null, adjustedUpper: null };
  return {
    adjustedShare: adjusted.rate,
    adjustedLower: adjusted.lower,
    adjustedUpper: Math.min(1, adjusted.upper),
  };
}

function bandsLeftOut(own: ByBand, reference: readonly number[]): AgeBand[] {
  return AGE_BANDS.filter((_, band) => own.cars[band] === 0 && (reference[band] as number) > 0);
}

function corrosion(
  climate: Climate | undefined,
): Pick<RotRegion, 'corrosionRateUmPerYear' | 'corrosivityCategory' | 'outsideFittedRange'> {
  const rate = climate && corrosionRate(climate);
  return {
    corrosionRateUmPerYear: rate?.umPerYear ?? null,
    corrosivityCategory: rate?.category ?? null,
    outsideFittedRange: rate?.outsideFittedRange ?? false,
  };
}
