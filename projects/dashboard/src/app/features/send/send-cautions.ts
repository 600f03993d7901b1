import { isDangerous, isLeftDangerous } from '#shared/domain/danger';
import type { Condition, Stage, Zone } from '#shared/domain/vocabulary';
import {
  FIRE,
  LEFT_ON_CAR,
  LOAD_BEARING_REPAIR,
  ROTTEN_POINT,
  type Danger,
} from '../../ui/caution/dangers';
import type { DraftDocument } from './draft-document';

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

const LIFTING: Danger = {
  danger: 'Lifting',
  words: 'Lift and stands at rated, sound points only; never rely on a jack alone.',
};
const MIST: Danger = {
  danger: 'Solvent mist',
  words:
    'Ventilate, wear a respirator fit for it, no flame, spark or heater near. Cold wax reaches less far: warm product, car and workshop, never with an open flame.',
};
const COVER: Danger = {
  danger: 'Brakes',
  words: 'Cover discs and pads before spraying: wax on them is a braking fault.',
};
const BRAKES: Danger = {
  danger: 'Brakes',
  words: 'Uncover, look for wax on discs and pads, and test them before hand-over.',
};

/** Beside each stage: what stripping, repair, masking, spraying and hand-over bring. */
export function stageCautions(document: DraftDocument): Partial<Record<Stage, Danger>> {
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
export function findingCautions(finding: DraftFinding): readonly Danger[] {
  const { action, structural, seenAs, zone } = finding;
  const known = seenAs !== undefined && structural !== undefined;
  const rated = known ? { ...finding, seenAs, structural } : undefined;
  return [
    ...(rated && isLeftDangerous(rated) ? [LEFT_ON_CAR] : []),
    ...(isRottenPoint(finding) ? [ROTTEN_POINT] : []),
    ...(action === 'patched' ? [fireAt(zone)] : []),
    ...(rated && action === 'patched' && isDangerous(rated) ? [LOAD_BEARING_REPAIR] : []),
  ];
}

/** Beside product and checks. */
export function productCautions(): readonly Danger[] {
  return [MIST, COVER];
}

/** At the end: what goes with the car. */
export function handOverCautions(document: DraftDocument): readonly Danger[] {
  const findings = document.findings ?? [];
  const left = findings.some((one) => findingCautions(one).includes(LEFT_ON_CAR));
  return [...(left ? [LEFT_ON_CAR] : []), BRAKES];
}

function fireAt(zone: Zone | undefined): Danger {
  if (!zone || !LINES_BESIDE.includes(zone)) return FIRE;
  const words =
    'Fuel and brake lines and wiring may run beside this place, and sprayed wax burns. Clear or shield before welding; keep a fire watch after.';
  return { danger: 'Fire', words };
}

function isRottenPoint({ zone, seenAs, workedAs }: DraftFinding): boolean {
  const rotten: readonly (Condition | undefined)[] = ['bubbling', 'holed'];
  return zone === 'jacking_point' && (rotten.includes(seenAs) || rotten.includes(workedAs));
}
