import type { ClaimRow } from '#shared/contracts/claim-list';
import type { JobSheet } from '#shared/contracts/jobs';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatDate } from '../../ui/format';
import { CLAIM_DECISION_NAMES } from '../../ui/words';
import { warrantyEnd } from './claim-head';
import type { ReadClaim } from './typed-claim';

/** What is known beside the claim itself; each may still be on its way. */
export interface ClaimSurroundings {
  readonly job: Pick<JobSheet, 'completedOn' | 'warrantyMonths' | 'vehicle'> | undefined;
  readonly row: ClaimRow | undefined;
}

/** Where a claim stands, and whether and why it counts. */
export function answerClaim(
  claim: ReadClaim,
  known: ClaimSurroundings,
): { readonly sentence: readonly AnswerPart[]; readonly second: readonly AnswerPart[] } {
  return {
    sentence: [...standing(claim), { quiet: `, claim ${claim.claimRef}` }],
    second: [...onJob(claim, known), ' ', countsBecause(claim, known)],
  };
}

function standing(claim: ReadClaim): AnswerPart[] {
  const { decision, proposedDecision, decidedOn } = claim;
  if (proposedDecision) {
    const until = decision === 'open' ? '' : `; ${CLAIM_DECISION_NAMES[decision]} until then`;
    return [
      { figure: 'Waits' },
      ` for head office: ${CLAIM_DECISION_NAMES[proposedDecision]} is proposed${until}`,
    ];
  }
  if (decision === 'open') return [{ figure: 'Open' }, `, made on ${formatDate(claim.madeOn)}`];
  const name = CLAIM_DECISION_NAMES[decision];
  const figure = `${name.charAt(0).toUpperCase()}${name.slice(1)}`;
  return [{ figure }, decidedOn ? ` on ${formatDate(decidedOn)}` : ''];
}

function onJob(claim: ReadClaim, { job, row }: ClaimSurroundings): AnswerPart[] {
  const { branch, jobRef } = claim;
  const sheet: Exclude<AnswerPart, string> = {
    text: `job ${jobRef}`,
    link: `/jobs/${encodeURIComponent(branch)}/${encodeURIComponent(jobRef)}`,
  };
  const vehicle = job?.vehicle ?? row?.vehicle;
  const car = vehicle
    ? `, ${vehicle.make} ${vehicle.model} ${vehicle.firstRegistered.slice(0, 4)}`
    : '';
  return ['On ', sheet, `${car}.`];
}

function countsBecause(claim: ReadClaim, { job, row }: ClaimSurroundings): string {
  if (!row) return '';
  const end = job && warrantyEnd(job);
  const month = row.month > 0 ? `in month ${row.month} after the job, ` : '';
  if (!row.inWarranty) {
    if (job && end === undefined) {
      return 'It counts in no figure: the package was sold without a warranty.';
    }
    const when = end === undefined ? '' : `, which was ${formatDate(end)}`;
    return `It counts in no figure: it was made ${month}after the warranty's end${when}.`;
  }
  if (row.counted) {
    const until = end === undefined ? '' : `, which runs to ${formatDate(end)}`;
    return `It counts: made ${month}within the warranty${until}.`;
  }
  return claim.decision === 'refused'
    ? 'It no longer counts: it was refused.'
    : 'It does not count yet.';
}
