import type { Params } from '@angular/router';
import type { ProductUse } from '#shared/contracts/products';
import type { WorstUse } from './worst-use';

/** Which of a row's cars are meant. */
export type Cars = 'all' | 'under' | 'over';

/**
 * Query parameters of Jobs that show the cars behind a row. With a norm its cars are all of their kind, whether or not any of the
 * product went in (rule 37); without one, those that list it.
 */
export function carsOfUse(
  row: Pick<ProductUse, 'product' | 'package' | 'bodyType' | 'normMl'>,
  cars: Cars,
  period: { readonly from: string; readonly to: string },
): Params {
  const { from, to } = period;
  const kind = { from, to, package: row.package, bodyType: row.bodyType };
  if (cars !== 'all') return { ...kind, product: row.product, use: cars };
  return row.normMl === null ? { ...kind, product: row.product } : kind;
}

/** The same for cars that got far too little, of one kind or of all. */
export function carsUnderQuery(
  { product, kind }: Pick<WorstUse, 'product' | 'kind'>,
  { from, to }: { readonly from: string; readonly to: string },
): Params {
  const narrowed = kind ? { package: kind.package, bodyType: kind.bodyType } : {};
  return { from, to, product, use: 'under', ...narrowed };
}
