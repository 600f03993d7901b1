import { isRot } from './recorded-job';
import type { Action, Condition } from './vocabulary';

/** What of a finding says whether it is a danger to people. */
export interface Endangering {
  structural: boolean;
  seenAs: Condition;
  workedAs?: Condition | null | undefined;
}

/** Rot where the car bears load; surface rust there is none yet. */
export function isDangerous(finding: Endangering): boolean {
  const { structural, seenAs, workedAs } = finding;
  return structural && isRot({ seenAs, ...(workedAs && { workedAs }) });
}

/** The same, left on the car; before anything was decided of it, nothing is left. */
export function isLeftDangerous(
  finding: Endangering & { action?: Action | null | undefined },
): boolean {
  const left = finding.action === 'deferred' || finding.action === 'declined';
  return left && isDangerous(finding);
}
