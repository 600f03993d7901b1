import { CHECKS, type Check, type CheckAnswer } from '#shared/domain/vocabulary';
import type { PackageCode } from './demo-network';
import { chance, uniform, type Random } from './random-draws';
import type { Finding } from './rot-findings';

export type CheckAnswers = Partial<Record<Check, CheckAnswer>>;

/** How often each check is missed at an ordinary branch. */
const MISSED: Record<Check, number> = {
  linersOff: 0.03,
  bothDirections: 0.045,
  brakesCovered: 0.008,
  driedOut: 0.05,
  drainsClear: 0.035,
  primerCured: 0.06,
};

/** The process checks of a job. One job in sixty has none recorded. */
export function drawChecks(
  random: Random,
  packageCode: PackageCode,
  findings: readonly Finding[],
  skipped: { check: Check; share: number } | undefined,
): CheckAnswers | undefined {
  if (chance(random, 1 / 60)) return undefined;
  const primed = findings.some((finding) => finding.action === 'patched');
  const answers: CheckAnswers = {};
  for (const check of CHECKS) {
    const missed = skipped?.check === check ? skipped.share : MISSED[check];
    answers[check] = applies(random, check, packageCode, primed)
      ? chance(random, missed)
        ? 'no'
        : 'yes'
      : 'na';
  }
  return answers;
}

function applies(random: Random, check: Check, packageCode: PackageCode, primed: boolean): boolean {
  if (check === 'primerCured') return primed;
  if (check === 'bothDirections') return packageCode !== 'underbody';
  if (check === 'linersOff') return packageCode !== 'top_up' || uniform(random) < 0.5;
  if (check === 'drainsClear') return packageCode !== 'underbody' || uniform(random) < 0.5;
  return true;
}
