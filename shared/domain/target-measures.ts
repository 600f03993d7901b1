import type { RuleBreak } from './job-rules';
import type { BranchMeasure } from './vocabulary';

/** What a target can be set for. Rot is what the cars bring, so nobody is asked to reach a share of it. */
export const TARGET_MEASURES = [
  'overrun',
  'claims',
  'product',
  'margin',
] as const satisfies BranchMeasure[];
export type TargetMeasure = (typeof TARGET_MEASURES)[number];

/** What is wrong with the target of a measure: a margin of all or more, a ratio of nothing. */
export function breaksOfTarget(measure: TargetMeasure, value: number | null): RuleBreak[] {
  if (value === null) return [];
  if (measure === 'margin' && value >= 1) {
    return [{ path: '/value', message: 'a margin is a share of revenue, below 1: 0.35 is 35 %' }];
  }
  if ((measure === 'overrun' || measure === 'product') && !(value > 0 && value <= 10)) {
    return [{ path: '/value', message: 'a ratio is above 0 and at most 10: 1.15 is 15 % over' }];
  }
  return [];
}
