import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import { addDays } from '#shared/domain/calendar';
import type { JobContent } from '#shared/contracts/jobs';

/** A plausible job for measuring with: about a dozen rows, every field filled, content spread by a seeded generator. */
export type JobMaker = (index: number) => { jobRef: string; content: JobContent };

/** Makes jobs completed within the `days` up to `today`. */
export function jobMaker(seed: number, today: string, days: number): JobMaker {
  const generator = xoroshiro128plus(seed);
  const next = (low: number, high: number): number =>
    low + (Math.abs(generator.next()) % (high - low + 1));
  return (index) => {
    const completedOn = addDays(today, -next(0, days));
    const rotten = next(0, 9) < 3;
    const repair = rotten ? next(30, 240) : 0;
    return {
      jobRef: `B${String(index).padStart(7, '0')}`,
      content: {
        vehicle: {
          ...(rotten && { key: `K-${index}` }),
          make: ['Velder', 'Orsa', 'Maren', 'Hask'][next(0, 3)] ?? 'Velder',
          model: ['Tessock', 'Brink', 'Lodd', 'Drover'][next(0, 3)] ?? 'Lodd',
          bodyType: 'hatchback',
          firstRegistered: `${next(2000, 2020)}-0${next(1, 9)}`,
          odometerKm: next(5_000, 300_000),
        },
        package: 'full',
        bookedOn: addDays(completedOn, -next(5, 30)),
        startedOn: addDays(completedOn, -1),
        completedOn,
        estimate: {
          priceCents: next(60_000, 95_000),
          stages: { strip: 90, clean: 75, dry: 20, mask: 40, apply: 120, refit: 60 },
        },
        actual: {
          stages: {
            strip: next(70, 160),
            clean: next(60, 200),
            dry: next(15, 60),
            repair,
            mask: next(30, 60),
            apply: next(100, 170),
            refit: next(50, 120),
          },
        },
        products: [
          { product: 'CW1', ml: next(3_000, 5_200) },
          { product: 'UW1', ml: next(3_000, 5_200) },
          { product: 'SC1', ml: next(800, 2_000) },
        ],
        consumables: [
          { kind: 'trim_clip', quantity: next(1, 9), unitCostCents: 45 },
          { kind: 'masking_film', quantity: 1, unitCostCents: 390 },
        ],
        findings: rotten
          ? [
              finding('sill_outer', 'left', repair),
              next(0, 3) === 0 ? left('rear_arch', 'right') : finding('rear_arch', 'right', 0),
              { ...finding('floor', 'centre', 0), seenAs: 'surface', workedAs: 'surface' },
            ]
          : [],
        checks: {
          linersOff: 'yes',
          bothDirections: 'yes',
          brakesCovered: 'yes',
          driedOut: 'yes',
          drainsClear: 'yes',
        },
        workshop: { temperatureC: next(4, 24), humidityPct: next(40, 80) },
        invoice: {
          number: String(index),
          issuedOn: completedOn,
          totalCents: next(60_000, 110_000),
        },
        notes: 'washed twice',
      },
    };
  };
}

function left(
  zone: 'rear_arch',
  side: 'left' | 'right',
): NonNullable<JobContent['findings']>[number] {
  return { zone, side, seenAs: 'bubbling', structural: true, action: 'deferred' };
}

function finding(
  zone: 'sill_outer' | 'rear_arch' | 'floor',
  side: 'left' | 'right' | 'centre',
  repairMinutes: number,
): NonNullable<JobContent['findings']>[number] {
  return {
    zone,
    side,
    seenAs: 'bubbling',
    workedAs: 'holed',
    structural: zone === 'sill_outer',
    action: 'patched',
    repairMinutes,
  };
}
