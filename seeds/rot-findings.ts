import type { JobContent } from '#shared/contracts/jobs';
import type { Condition, Side, Zone } from '#shared/domain/vocabulary';
import type { Car } from './cars';
import {
  between,
  chance,
  count,
  pick,
  pickWeighted,
  uniform,
  wholeBetween,
  type Random,
} from './random-draws';

export type Finding = NonNullable<JobContent['findings']>[number];

interface ZoneNature {
  zone: Zone;
  sides: readonly Side[];
  /** How often rot sits here, against other zones. The outer sill leads by design (planted fact). */
  weight: number;
  /** Chance that the zone is load-bearing where the rot is. */
  structural: number;
  /** Chance that a bubble opens into a hole once worked. */
  opens: number;
}

const BOTH = ['left', 'right'] as const;
const MIDDLE = ['centre'] as const;

/** Common practice, no source: rot sits low, behind liners and near blocked drains. */
const ZONE_NATURES: readonly ZoneNature[] = [
  { zone: 'sill_outer', sides: BOTH, weight: 30, structural: 0.45, opens: 0.58 },
  { zone: 'rear_arch', sides: BOTH, weight: 17, structural: 0.2, opens: 0.52 },
  { zone: 'sill_inner', sides: BOTH, weight: 12, structural: 1, opens: 0.55 },
  { zone: 'front_arch', sides: BOTH, weight: 9, structural: 0.15, opens: 0.45 },
  { zone: 'jacking_point', sides: BOTH, weight: 9, structural: 1, opens: 0.55 },
  { zone: 'front_wing', sides: BOTH, weight: 8, structural: 0, opens: 0.4 },
  { zone: 'floor', sides: BOTH, weight: 6, structural: 0.35, opens: 0.45 },
  { zone: 'door_bottom', sides: BOTH, weight: 8, structural: 0, opens: 0.35 },
  { zone: 'bulkhead_drain', sides: BOTH, weight: 5, structural: 0.3, opens: 0.55 },
  { zone: 'rear_subframe', sides: MIDDLE, weight: 5, structural: 1, opens: 0.3 },
  { zone: 'front_subframe', sides: MIDDLE, weight: 3, structural: 1, opens: 0.3 },
  { zone: 'chassis_rail', sides: BOTH, weight: 3.5, structural: 1, opens: 0.4 },
  { zone: 'boot_floor', sides: MIDDLE, weight: 4, structural: 0.2, opens: 0.4 },
  { zone: 'tailgate', sides: MIDDLE, weight: 4, structural: 0, opens: 0.35 },
  { zone: 'slam_panel', sides: MIDDLE, weight: 2, structural: 0, opens: 0.3 },
];
const BY_WEIGHT = ZONE_NATURES.map((nature) => [nature, nature.weight] as const);
const BY_ZONE = new Map(ZONE_NATURES.map((nature) => [nature.zone, nature]));

/** Repair minutes a branch finds room for on the day, before the rest is put off. */
const ROOM_MINUTES = 330;

/** Chance of rot by age in years for a hazard factor of salt and model: 1 − exp(−hazard), a power of age. Invented. */
export function rotChance(years: number, hazardFactor: number): number {
  const age = Math.min(years, 24);
  return 1 - Math.exp(-(0.011 + 0.0022 * age ** 2.08) * hazardFactor);
}

/** What is found under a car, and what is done about it. */
export function drawFindings(
  random: Random,
  car: Car,
  years: number,
  regionRot: number,
): Finding[] {
  // A classic has usually been restored once: half the hazard of its years.
  const restored = car.model.bodyType === 'classic' ? 0.4 : 1;
  const findings: Finding[] = [];
  if (chance(random, rotChance(years, regionRot * car.model.rot * restored))) {
    addRot(random, findings, years);
  }
  if (chance(random, Math.min(0.65, 0.08 + 0.035 * years))) addSurface(random, findings);
  return findings;
}

/** Rot that was put off at an earlier visit, now worked in the same zone and side (rule 72). */
export function workOpenRot(random: Random, car: Car): Finding[] {
  const findings: Finding[] = [];
  for (const { zone, side } of car.open) {
    if (!chance(random, 0.8)) continue;
    const nature = BY_ZONE.get(zone) as ZoneNature;
    findings.push(worked(random, nature, side, chance(random, 0.55) ? 'holed' : 'bubbling'));
  }
  return findings;
}

function addRot(random: Random, findings: Finding[], years: number): void {
  const wanted = 1 + count(random, 0.35 + 0.05 * Math.min(years, 24));
  // One owner decides for the whole car, before the rest is asked.
  const refusal = chance(random, 0.11);
  let room = ROOM_MINUTES * between(random, 0.7, 1.15);
  for (let tries = 0; tries < wanted; tries += 1) {
    const nature = pickWeighted(random, BY_WEIGHT);
    const side = pick(random, nature.sides);
    if (findings.some((other) => other.zone === nature.zone && other.side === side)) continue;
    const seenAs = chance(random, 0.16 + 0.012 * Math.min(years, 24)) ? 'holed' : 'bubbling';
    const finding = worked(random, nature, side, seenAs);
    const minutes = finding.repairMinutes ?? 0;
    if (refusal) findings.push(left(random, finding, 'declined'));
    else if (minutes > room || chance(random, 0.07))
      findings.push(left(random, finding, 'deferred'));
    else {
      findings.push(finding);
      room -= minutes;
    }
  }
}

function addSurface(random: Random, findings: Finding[]): void {
  const nature = pickWeighted(random, BY_WEIGHT);
  const side = pick(random, nature.sides);
  if (findings.some((other) => other.zone === nature.zone && other.side === side)) return;
  findings.push({
    zone: nature.zone,
    side,
    seenAs: 'surface',
    workedAs: 'surface',
    structural: nature.structural === 1,
    action: 'treated',
  });
}

function worked(random: Random, nature: ZoneNature, side: Side, seenAs: Condition): Finding {
  const workedAs = seenAs === 'holed' || chance(random, nature.opens) ? 'holed' : 'bubbling';
  const heavy = nature.structural === 1 ? 1.25 : 1;
  const minutes =
    workedAs === 'holed' ? between(random, 50, 150) * heavy : wholeBetween(random, 15, 45);
  return {
    zone: nature.zone,
    side,
    seenAs,
    workedAs,
    structural: chance(random, nature.structural),
    action: workedAs === 'holed' ? 'patched' : 'treated',
    repairMinutes: Math.round(minutes / 5) * 5,
  };
}

/** The same finding left on the car: sometimes worked far enough to know how bad it is, mostly not. */
function left(random: Random, finding: Finding, action: 'deferred' | 'declined'): Finding {
  const { zone, side, seenAs, workedAs, structural } = finding;
  const opened = action === 'deferred' && uniform(random) < 0.4;
  return { zone, side, seenAs, ...(opened && { workedAs }), structural, action };
}
