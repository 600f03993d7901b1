import type { NormedCars } from '#db/queries/products';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { ratioEstimate } from '#shared/stats/ratio-estimate';

/** Product used against the norm over some cars that have one. */
export interface NormRatio {
  cars: number;
  ratioToNorm: number | null;
  lower: number | null;
  upper: number | null;
}

/** Σ ml / Σ norm ml with its interval (rule 39); nothing but the count below five cars (rule 13). */
export function normRatio(cars: Pick<NormedCars, 'used' | 'foreseen'>): NormRatio {
  const { used, foreseen } = cars;
  const estimate = used.length >= FEWEST_CARS ? ratioEstimate(used, foreseen) : undefined;
  return {
    cars: used.length,
    ratioToNorm: estimate?.ratio ?? null,
    lower: estimate?.lower ?? null,
    upper: estimate?.upper ?? null,
  };
}
