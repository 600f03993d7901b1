import { countCarCells, productCodes, readProductLines } from '#db/queries/products';
import type { ScopedDb } from '#db/scoped-db';
import type { OutOf } from '#shared/contracts/endpoint';
import type { getNormMedians } from '#shared/contracts/set-up-help';
import type { Period } from '#shared/domain/period';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import type { BodyType } from '#shared/domain/vocabulary';
import { ascending, quantile } from '#shared/stats/quantile';

/** Which cars a norm is to be taken from. */
export interface MediansQuestion {
  period: Period;
  packageId: number;
  bodyType: BodyType;
}

type Medians = OutOf<typeof getNormMedians>;

/** Product a car that lists it, by product, over the cars of a package and body type; null below five of them (rule 13). */
export function normMedians(
  db: ScopedDb,
  { period, packageId, bodyType }: MediansQuestion,
): Medians {
  return db.snapshot(() => {
    const filters = { ...period, packageIds: [packageId], bodyTypes: [bodyType] };
    const codes = productCodes(db);
    const products = readProductLines(db, filters)
      .map(({ productId, ml }) => ({ product: codes.get(productId) ?? '', ...spreadOf(ml) }))
      .sort((a, b) => (a.product < b.product ? -1 : 1));
    const cars = countCarCells(db, filters).reduce((sum, cell) => sum + cell.cars, 0);
    return { ...period, cars, products };
  });
}

function spreadOf(ml: readonly number[]): Omit<Medians['products'][number], 'product'> {
  const sorted = ascending(ml);
  const at = (p: number): number | null =>
    ml.length < FEWEST_CARS ? null : (quantile(sorted, p) ?? null);
  return { cars: ml.length, medianMl: at(0.5), p10Ml: at(0.1), p90Ml: at(0.9) };
}
