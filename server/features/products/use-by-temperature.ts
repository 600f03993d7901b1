import type { ProductLines } from '#db/queries/products';
import type { ProductTemperature } from '#shared/contracts/products';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { ascending, quantile } from '#shared/stats/quantile';
import { theilSenInterval } from '#shared/stats/theil-sen-interval';

/** Degrees of one class of the picture. */
const CLASS_C = 5;

/** How much of a product goes in as the workshop warms: over the cars listing it, ml above 0, with a temperature (rule 40). */
export function useByTemperature(
  product: string,
  groups: readonly Pick<ProductLines, 'ml' | 'temperatures'>[],
): ProductTemperature {
  const temperatures: number[] = [];
  const millilitres: number[] = [];
  for (const { ml, temperatures: degrees } of groups) {
    ml.forEach((each, car) => {
      const degree = degrees[car] ?? null;
      if (each === 0 || degree === null) return;
      temperatures.push(degree);
      millilitres.push(each);
    });
  }
  const shown = temperatures.length >= FEWEST_CARS;
  const trend = shown ? theilSenInterval(temperatures, millilitres) : undefined;
  return {
    product,
    cars: temperatures.length,
    slopeMlPerDegree: trend?.slope ?? null,
    lower: trend?.lower ?? null,
    upper: trend?.upper ?? null,
    classes: classesOf(temperatures, millilitres),
  };
}

/** Classes that have cars, coldest first. */
function classesOf(
  temperatures: readonly number[],
  millilitres: readonly number[],
): ProductTemperature['classes'] {
  const classes = new Map<number, number[]>();
  temperatures.forEach((degree, car) => {
    const fromC = CLASS_C * Math.floor(degree / CLASS_C);
    const own = classes.get(fromC);
    if (own) own.push(millilitres[car] as number);
    else classes.set(fromC, [millilitres[car] as number]);
  });
  return [...classes]
    .sort(([a], [b]) => a - b)
    .map(([fromC, ml]) => {
      const sorted = ml.length >= FEWEST_CARS ? ascending(ml) : [];
      return {
        fromC,
        cars: ml.length,
        p25Ml: quantile(sorted, 0.25) ?? null,
        medianMl: quantile(sorted, 0.5) ?? null,
        p75Ml: quantile(sorted, 0.75) ?? null,
      };
    });
}
