import type { ProductUse } from '#shared/contracts/products';
import { wilsonInterval } from '#shared/stats/wilson-interval';

/** From so many cars under on, a kind of car is named for it; one or two may be chance (own choice). */
const LEAST_CARS = 3;

/** Cars that got far too little of a product: of one kind of car, or of all kinds with a norm. */
export interface WorstUse {
  readonly product: string;
  /** Null: all kinds of car together. */
  readonly kind: Pick<ProductUse, 'package' | 'bodyType'> | null;
  readonly cars: number;
  readonly carsListing: number;
  readonly under: number;
}

/**
 * Where cars got far too little most surely: the kind of car whose interval of the share under starts highest, so that three thin
 * cars of nine do not outdo twenty of fifty; where no kind has enough of them, the product. `undefined` when no car was under.
 */
export function worstUse(use: readonly ProductUse[]): WorstUse | undefined {
  const kinds = use.flatMap((row): WorstUse[] =>
    row.under === null || row.underShare === null ? [] : [{ ...row, kind: row, under: row.under }],
  );
  return (
    surest(kinds.filter(({ under }) => under >= LEAST_CARS)) ??
    surest(byProduct(kinds).filter(({ under }) => under > 0))
  );
}

function surest(found: readonly WorstUse[]): WorstUse | undefined {
  let worst: { one: WorstUse; least: number } | undefined;
  for (const one of found) {
    const least = wilsonInterval(one.under, one.cars)?.lower ?? 0;
    if (!worst || least > worst.least) worst = { one, least };
  }
  return worst?.one;
}

function byProduct(kinds: readonly WorstUse[]): WorstUse[] {
  const sums = new Map<string, WorstUse>();
  for (const { product, cars, carsListing, under } of kinds) {
    const sum = sums.get(product);
    sums.set(product, {
      product,
      kind: null,
      cars: cars + (sum?.cars ?? 0),
      carsListing: carsListing + (sum?.carsListing ?? 0),
      under: under + (sum?.under ?? 0),
    });
  }
  return [...sums.values()];
}
