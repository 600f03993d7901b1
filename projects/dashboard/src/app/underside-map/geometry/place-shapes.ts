import { ZONES, type Side, type Zone } from '#shared/domain/vocabulary';
import { naturalSides } from '#shared/domain/zone-sides';
import { closedHalf, joined, mirrored } from './outline';
import { MIDDLE_HALVES, SIDED_PATHS, TUNNEL_HALF } from './zone-paths';

export type SidedZone = keyof typeof SIDED_PATHS;
export type MiddleZone = keyof typeof MIDDLE_HALVES;

/** Whether a car has the zone once on each side; the others lie on its middle. */
export function isSided(zone: Zone): zone is SidedZone {
  return zone in SIDED_PATHS;
}

/** Every zone on the sides where a car has it, in the order of the vocabulary. */
export const USUAL_PLACES = ZONES.flatMap((zone) =>
  naturalSides(zone).map((side) => ({ zone, side })),
);

/**
 * The shapes of a place; every zone and side has at least one. The middle of the floor is the tunnel; the centre of any other
 * zone that lies on both sides is both of them, since the middle belongs to neither. Left or right of a zone on the middle is
 * that half of it.
 */
export function shapesOf(zone: Zone, side: Side): readonly string[] {
  if (!isSided(zone)) {
    const half: string = MIDDLE_HALVES[zone];
    if (side === 'centre') return [joined(half)];
    return [side === 'left' ? closedHalf(half) : mirrored(closedHalf(half))];
  }
  const left: readonly string[] = SIDED_PATHS[zone];
  if (side === 'left') return left;
  if (side === 'right') return left.map(mirrored);
  return zone === 'floor' ? [joined(TUNNEL_HALF)] : [...left, ...left.map(mirrored)];
}

/** Zones as the eye goes over the car, front to back; what lies on another comes after it. */
const FRONT_TO_BACK: readonly Zone[] = [
  'slam_panel',
  'front_wing',
  'front_arch',
  'chassis_rail',
  'front_subframe',
  'bulkhead_drain',
  'door_bottom',
  'sill_outer',
  'sill_inner',
  'jacking_point',
  'floor',
  'rear_arch',
  'rear_subframe',
  'boot_floor',
  'tailgate',
];
const TOP_TO_FOOT: readonly Side[] = ['left', 'centre', 'right'];

/** Orders places along the left side, then the middle, then the right: the way of the arrow keys. */
export function alongTheCar<Place extends { readonly zone: Zone; readonly side: Side }>(
  places: readonly Place[],
): readonly Place[] {
  const rank = ({ zone, side }: Place): number =>
    TOP_TO_FOOT.indexOf(side) * FRONT_TO_BACK.length + FRONT_TO_BACK.indexOf(zone);
  return [...places].sort((a, b) => rank(a) - rank(b));
}
