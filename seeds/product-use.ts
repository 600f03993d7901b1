import type { BodyType } from '#shared/domain/vocabulary';
import { normOf } from './catalogue';
import type { PackageCode, ProductCode } from './demo-network';
import { between, chance, factorAround, type Random } from './random-draws';
import type { Finding } from './rot-findings';

/** Extra wax for each degree under 16 °C, as a share: cold wax is thick, and more of it goes in. Common practice, no source. */
const COLD_SHARE: Partial<Record<ProductCode, number>> = { CW1: 0.012, UW1: 0.005 };

/** What was sprayed: the norm as this branch, this day and this car make it, and what the rot asked for. */
export function drawProducts(
  random: Random,
  packageCode: PackageCode,
  bodyType: BodyType,
  temperatureC: number,
  generosity: number,
  findings: readonly Finding[],
): { product: ProductCode; ml: number }[] {
  const lines: { product: ProductCode; ml: number }[] = [];
  const car = factorAround(random, 0.07);
  for (const { product, ml } of normOf(packageCode, bodyType)) {
    // Now and then stone-chip coat is left out altogether.
    if (product === 'SC1' && chance(random, 0.03)) continue;
    const cold = 1 + (COLD_SHARE[product] ?? 0) * (16 - temperatureC);
    lines.push({
      product,
      ml: tens(ml * 0.99 * generosity * car * cold * factorAround(random, 0.08)),
    });
  }
  const worked = findings.filter((finding) => finding.workedAs && finding.action !== 'deferred');
  if (worked.length > 0) {
    lines.push({ product: 'RC1', ml: tens(worked.length * between(random, 50, 110)) });
  }
  const patched = worked.filter((finding) => finding.action === 'patched').length;
  if (patched > 0) {
    lines.push({ product: 'ZP1', ml: tens(patched * between(random, 70, 130)) });
    lines.push({ product: 'SS1', ml: tens(patched * between(random, 40, 90)) });
  }
  return lines;
}

function tens(ml: number): number {
  return Math.max(10, Math.round(ml / 10) * 10);
}
