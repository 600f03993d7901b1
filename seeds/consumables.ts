import type { JobContent } from '#shared/contracts/jobs';
import type { PackageCode } from './demo-network';
import { chance, count, type Random } from './random-draws';
import type { Finding } from './rot-findings';

type Consumable = NonNullable<JobContent['consumables']>[number];

/** Clips that broke, plugs, film and steel: few clips on young cars, many on old ones. A unit cost is written on about one line in four. */
export function drawConsumables(
  random: Random,
  packageCode: PackageCode,
  years: number,
  findings: readonly Finding[],
  level: number,
): Consumable[] {
  const lines: Consumable[] = [];
  const light = packageCode === 'top_up' ? 0.4 : 1;
  add('trim_clip', count(random, (1.6 + 0.36 * Math.min(years, 22)) * light), 45);
  if (packageCode !== 'underbody') add('blanking_plug', count(random, 3 * light), 60);
  add('masking_film', 1, 420);
  const patched = findings.filter((finding) => finding.action === 'patched').length;
  add('patch_steel', patched, 950);
  if (chance(random, 0.05)) add('other', 1, 350);
  return lines;

  function add(kind: Consumable['kind'], quantity: number, cents: number): void {
    if (quantity === 0) return;
    const known = chance(random, 0.25);
    lines.push({ kind, quantity, ...(known && { unitCostCents: Math.round(cents * level) }) });
  }
}
