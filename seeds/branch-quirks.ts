import type { Check, Stage } from '#shared/domain/vocabulary';
import type { BranchNature } from './branches';
import { PLANTED_FACTS } from './planted-facts';

/** How a branch works on a day: its own nature with whatever is planted in it. */
export interface BranchWays {
  pace: number;
  generosity: number;
  /** Share of the quoted price given away at the counter. */
  givenAway: number;
  skipped?: { check: Check; share: number };
  slowStage?: { stage: Stage; times: number };
}

/** The ways of a branch a number of days before today. */
export function waysOf(branch: BranchNature, daysBeforeToday: number): BranchWays {
  const ways: BranchWays = { pace: branch.pace, generosity: branch.generosity, givenAway: 0 };
  const quirk = branch.quirk;
  if (quirk?.kind === 'drifts') {
    const { weeks, priceGivenAway, labourAdded } = PLANTED_FACTS.driftingBranch;
    const progress = Math.max(0, 1 - daysBeforeToday / 7 / weeks);
    ways.givenAway = priceGivenAway * progress;
    ways.pace *= 1 + labourAdded * progress;
  }
  if (quirk?.kind === 'under-applies') {
    ways.generosity = PLANTED_FACTS.underApplyingBranch.ratioToNorm;
  }
  if (quirk?.kind === 'skips') {
    ways.skipped = { check: quirk.check, share: PLANTED_FACTS.checkSkippingBranch.shareNo };
  }
  if (quirk?.kind === 'slow') {
    ways.slowStage = { stage: quirk.stage, times: PLANTED_FACTS.slowStageBranch.times };
  }
  return ways;
}
