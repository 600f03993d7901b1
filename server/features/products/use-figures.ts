import type { ProductUse } from '#shared/contracts/products';
import { roundHalfUp } from '#shared/domain/money';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { compensatedSum } from '#shared/stats/compensated-sum';
import { ascending, quantile } from '#shared/stats/quantile';

/** What went into the cars of one product, package and body type. */
export interface UsedProduct {
  /** With a norm every car of the package and body type, without one those that list the product (rule 37). */
  cars: number;
  /** Millilitres of the cars that list it; the other cars took 0. */
  ml: readonly number[];
  normMl: number | null;
  /** Σ of the rounded line costs that were known, and how many lines that are. */
  costCents: number;
  costedLines: number;
}

/** The figures of one row of product use; a car that lists nothing of a normed product took 0 ml at no cost (rule 37). */
export function useFigures(
  used: UsedProduct,
): Omit<ProductUse, 'product' | 'package' | 'bodyType'> {
  const { cars, ml, normMl } = used;
  const shown = cars >= FEWEST_CARS;
  // Room for every car: those that list nothing stay at 0.
  const all = new Float64Array(cars);
  all.set(ml);
  const sorted = shown ? ascending(all) : [];
  const at = (p: number): number | null => quantile(sorted, p) ?? null;
  const under = normMl === null ? null : count(all, (each) => isUnder(each, normMl));
  const over = normMl === null ? null : count(all, (each) => isOver(each, normMl));
  return {
    cars,
    carsListing: count(ml, (each) => each > 0),
    meanMl: shown ? compensatedSum(all) / cars : null,
    p10Ml: at(0.1),
    p25Ml: at(0.25),
    medianMl: at(0.5),
    p75Ml: at(0.75),
    p90Ml: at(0.9),
    normMl,
    costPerCarCents: costPerCar(used.costCents, cars - (ml.length - used.costedLines)),
    under,
    over,
    underShare: shown && under !== null ? under / cars : null,
    overShare: shown && over !== null ? over / cars : null,
  };
}

/**
 * The mean of rounded line costs over the cars whose cost is known, rounded half up (rule 38). A mean is no sum of money, which
 * alone rule 13 lets stand: of one car it would be that car's cost.
 */
export function costPerCar(costCents: number, costedCars: number): number | null {
  return costedCars >= FEWEST_CARS ? roundHalfUp(costCents, costedCars) : null;
}

/** Whether less than 70 % of the norm went in; whole numbers, so that the edge is exact (rule 37). */
function isUnder(ml: number, normMl: number): boolean {
  return 10 * ml < 7 * normMl;
}

/** Whether more than 130 % of the norm went in. */
function isOver(ml: number, normMl: number): boolean {
  return 10 * ml > 13 * normMl;
}

function count(values: ArrayLike<number>, fits: (value: number) => boolean): number {
  let found = 0;
  for (let index = 0; index < values.length; index += 1) {
    if (fits(values[index] as number)) found += 1;
  }
  return found;
}
