import type { BranchMeasure } from './vocabulary';

/** What a target can be set for. Rot is what the cars bring, so nobody is asked to reach a share of it. */
export const TARGET_MEASURES = [
  'overrun',
  'claims',
  'product',
  'margin',
] as const satisfies BranchMeasure[];
export type TargetMeasure = (typeof TARGET_MEASURES)[number];
