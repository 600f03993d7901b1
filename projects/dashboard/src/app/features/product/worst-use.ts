import type { ProductUse } from '#shared/contracts/products';
import { wilsonInterval } from '#shared/stats/wilson-interval';

/** Below one car in a hundred nothing is said. */
const LEAST_SHARE = 0.01;

/**
 * The row in which cars got far too little most surely: the one whose interval of the share under starts highest, so that one
 * thin car of five does not outdo twenty of a hundred. `undefined` when nowhere one car in a hundred was under.
 */
export function worstUse(use: readonly ProductUse[]): ProductUse | undefined {
  let worst: { row: ProductUse; least: number } | undefined;
  for (const row of use) {
    if (row.under === null || row.underShare === null || row.underShare < LEAST_SHARE) continue;
    const least = wilsonInterval(row.under, row.cars)?.lower ?? 0;
    if (!worst || least > worst.least) worst = { row, least };
  }
  return worst?.row;
}
