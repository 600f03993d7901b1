import type { Side, Zone } from '#shared/domain/vocabulary';
import { CAR, type Point } from './outline';
import { isSided } from './place-shapes';

/** Where a leader or a mark meets a zone: a point well inside its first shape, on the left for zones on both sides. */
const ANCHORS: Readonly<Record<Zone, Point>> = {
  front_wing: [62, 72],
  front_arch: [118, 66],
  bulkhead_drain: [317, 72],
  jacking_point: [370, 40],
  sill_outer: [470, 32],
  sill_inner: [556, 48.5],
  floor: [524, 138],
  chassis_rail: [72, 117],
  rear_arch: [808, 96],
  door_bottom: [640, 17.5],
  front_subframe: [217, 195],
  rear_subframe: [810, 195],
  boot_floor: [906, 195],
  slam_panel: [36, 195],
  tailgate: [971, 195],
};

/** Half the way from the middle line to a middle zone's edge, for a finding on one side of it. */
const HALFWAY = 38;

/** The point at which a place is labelled or marked. */
export function anchorOf(zone: Zone, side: Side): Point {
  const [x, y] = ANCHORS[zone];
  if (side === 'centre') return [x, CAR.middle];
  const left = isSided(zone) ? y : CAR.middle - HALFWAY;
  return [x, side === 'left' ? left : 2 * CAR.middle - left];
}
