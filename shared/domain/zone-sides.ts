import { SIDES, type Side, type Zone } from './vocabulary';

const BOTH: readonly Side[] = ['left', 'right'];
const MIDDLE: readonly Side[] = ['centre'];

const NATURAL: Readonly<Record<Zone, readonly Side[]>> = {
  front_wing: BOTH,
  front_arch: BOTH,
  bulkhead_drain: BOTH,
  sill_outer: BOTH,
  sill_inner: BOTH,
  floor: BOTH,
  jacking_point: BOTH,
  chassis_rail: BOTH,
  front_subframe: MIDDLE,
  rear_arch: BOTH,
  rear_subframe: MIDDLE,
  boot_floor: MIDDLE,
  door_bottom: BOTH,
  slam_panel: MIDDLE,
  tailgate: MIDDLE,
};

/** The sides on which a car has a zone by its build: left and right, or one across the middle. A finding may name any side. */
export function naturalSides(zone: Zone): readonly Side[] {
  return NATURAL[zone];
}

/** The sides to tell of a zone, in the order of the vocabulary: its natural ones, and any other that has something. */
export function sidesToTell(zone: Zone, has: (side: Side) => boolean): Side[] {
  return SIDES.filter((side) => NATURAL[zone].includes(side) || has(side));
}
