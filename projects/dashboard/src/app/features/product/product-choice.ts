import type { ProductUse } from '#shared/contracts/products';

/** Products that the answer has rows of, those in most cars first. */
export function productsInUse(use: readonly ProductUse[]): readonly string[] {
  const cars = new Map<string, number>();
  for (const row of use) {
    cars.set(row.product, (cars.get(row.product) ?? 0) + row.carsListing);
  }
  return [...cars].sort(([a, m], [b, n]) => n - m || (a < b ? -1 : 1)).map(([code]) => code);
}

/** The product asked for in the URL, or the one in most cars. */
export function chosenProduct(
  asked: string | undefined,
  offered: readonly string[],
): string | undefined {
  return offered.find((code) => code === asked) ?? offered[0];
}
