import { isDangerous, isLeftDangerous } from '#shared/domain/danger';
import type { Condition, Stage, Zone } from '#shared/domain/vocabulary';
import type { DraftDocument } from './draft-document';

/** A danger to people, shown where the work that brings it is written down. */
export interface SendCaution {
  readonly danger: string;
  readonly words: string;
}

type DraftFinding = NonNullable<DraftDocument['findings']>[number];

/** Zones with lines, tank or tensioners right beside them. Common practice, no source. */
const LINES_BESIDE: readonly Zone[] = [
  'sill_inner',
  'sill_outer',
  'floor',
  'chassis_rail',
  'rear_arch',
  'rear_subframe',
  'boot_floor',
  'bulkhead_drain',
];

const LIFTING: SendCaution = {
  danger: 'Lifting',
  words: 'Lift and stands at rated, sound points only; never rely on a jack alone.',
};
const ROTTEN_POINT: SendCaution = {
  danger: 'Lifting',
  words:
    'A jacking point of this car is rotten. Never support the car on it: use other rated, sound points, and check the stands before going under.',
};
const FIRE: SendCaution = {
  danger: 'Fire',
  words:
    'Welding near fuel and brake lines, the tank, airbags, tensioners, wiring, underseal and fresh wax: clear or shield them first, keep a fire watch after.',
};
const STRUCTURAL: SendCaution = {
  danger: 'Load-bearing repair',
  words:
    'It is for a competent and, where required, licensed person; the local inspection rules decide whether it is enough.',
};
const LEFT: SendCaution = {
  danger: 'Left on the car',
  words:
    'Load-bearing rot stays on it. The car may not be fit for the road: tell the owner in writing, and note the date.',
};
const MIST: SendCaution = {
  danger: 'Solvent mist',
  words:
    'Ventilate, wear a respirator fit for it, no flame, spark or heater near. Cold wax reaches less far: warm product, car and workshop, never with an open flame.',
};
const COVER: SendCaution = {
  danger: 'Brakes',
  words: 'Cover discs and pads before spraying: wax on them is a braking fault.',
};
const BRAKES: SendCaution = {
  danger: 'Brakes',
  words: 'Uncover, look for wax on discs and pads, and test them before hand-over.',
};

/** Beside each stage: what stripping, repair, masking, spraying and hand-over bring. */
export function stageCautions(document: DraftDocument): Partial<Record<Stage, SendCaution>> {
  const repairs =
    (document.actual?.stages.repair ?? 0) > 0 ||
    document.timers?.repair !== undefined ||
    (document.findings ?? []).some(({ action }) => action === 'patched');
  return {
    strip: (document.findings ?? []).some(isRottenPoint) ? ROTTEN_POINT : LIFTING,
    ...(repairs ? { repair: FIRE } : {}),
    mask: COVER,
    apply: MIST,
    refit: BRAKES,
  };
}

/** Beside one finding: what its repair, or leaving it, brings. */
export function findingCautions(finding: DraftFinding): readonly SendCaution[] {
  const { action, structural, seenAs, zone } = finding;
  const known = seenAs !== undefined && structural !== undefined;
  const rated = known ? { ...finding, seenAs, structural } : undefined;
  return [
    ...(rated && isLeftDangerous(rated) ? [LEFT] : []),
    ...(isRottenPoint(finding) ? [ROTTEN_POINT] : []),
    ...(action === 'patched' ? [fireAt(zone)] : []),
    ...(rated && action === 'patched' && isDangerous(rated) ? [STRUCTURAL] : []),
  ];
}

/** Beside product and checks. */
export function productCautions(): readonly SendCaution[] {
  return [MIST, COVER];
}

/** At the end: what goes with the car. */
export function handOverCautions(document: DraftDocument): readonly SendCaution[] {
  const findings = document.findings ?? [];
  const left = findings.some((one) => findingCautions(one).includes(LEFT));
  return [...(left ? [LEFT] : []), BRAKES];
}

function fireAt(zone: Zone | undefined): SendCaution {
  if (!zone || !LINES_BESIDE.includes(zone)) return FIRE;
  const words =
    'Fuel and brake lines and wiring may run beside this place, and sprayed wax burns. Clear or shield before welding; keep a fire watch after.';
  return { danger: 'Fire', words };
}

function isRottenPoint({ zone, seenAs, workedAs }: DraftFinding): boolean {
  const rotten: readonly (Condition | undefined)[] = ['bubbling', 'holed'];
  return zone === 'jacking_point' && (rotten.includes(seenAs) || rotten.includes(workedAs));
}
