import type { JobSheet } from '#shared/contracts/jobs';
import { isLeftDangerous } from '#shared/domain/danger';
import { CONDITION_NAMES, SIDE_NAMES, ZONE_NAMES } from '../../ui/words';

type Finding = NonNullable<JobSheet['findings']>[number];

/** A finding as the owner reads it, under the number that it has on the car. */
export interface HandedFinding {
  readonly number: number;
  readonly place: string;
  readonly words: string;
  readonly dangerous: boolean;
}

/** Findings in the order of their numbers: left and dangerous, left, then dealt with. */
export interface HandedFindings {
  readonly ordered: readonly Finding[];
  readonly left: readonly HandedFinding[];
  readonly done: readonly HandedFinding[];
}

/** Numbers the findings so that what was left comes first, on the car as in the lists. */
export function handedFindings(findings: readonly Finding[]): HandedFindings {
  const left = findings.filter(isLeft);
  const ordered = [
    ...left.filter(isLeftDangerous),
    ...left.filter((finding) => !isLeftDangerous(finding)),
    ...findings.filter((finding) => !isLeft(finding)),
  ];
  const handed = ordered.map((finding, index) => handedFinding(finding, index + 1));
  return { ordered, left: handed.slice(0, left.length), done: handed.slice(left.length) };
}

function isLeft({ action }: Finding): boolean {
  return action === 'deferred' || action === 'declined';
}

function handedFinding(finding: Finding, number: number): HandedFinding {
  return {
    number,
    place: `${ZONE_NAMES[finding.zone]}, ${SIDE_NAMES[finding.side]}`,
    words: `${conditionWords(finding)}; ${DONE[finding.action]}`,
    dangerous: isLeftDangerous(finding),
  };
}

function conditionWords({ seenAs, workedAs }: Finding): string {
  return workedAs && workedAs !== seenAs
    ? `${FOUND[seenAs]}, ${CONDITION_NAMES[workedAs]} once opened`
    : FOUND[seenAs];
}

/** Said to someone who does not know the trade's words. */
const FOUND = {
  surface: 'rust on sound metal',
  bubbling: 'rust lifting the paint or coat',
  holed: 'rusted through',
} as const;
const DONE = {
  treated: 'rust stopped, metal kept',
  patched: 'metal replaced',
  deferred: 'left for another day',
  declined: 'left as the owner wished',
} as const;
