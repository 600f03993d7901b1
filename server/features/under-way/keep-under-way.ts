import type { UnderWayDeed, UnderWayWriter } from '#db/under-way-writer';
import type { UnderWayRow } from '#db/queries/under-way';
import type { JobDraft } from '#shared/contracts/under-way';
import { keepMoneyUnderWay } from '#shared/domain/keep-stored-money';
import { checkPreconditions, type Preconditions } from '#shared/domain/preconditions';
import { Refusal } from '#shared/domain/refusal';
import { draftText } from './draft-text';

/** Jobs that may be under way at one branch: far more than stand in any workshop, and still a list that is read in one go. */
const MOST_UNDER_WAY = 200;

/** How a job under way is kept: whether money left out stays, and what the sender has seen of it. */
export interface Keeping {
  money: 'seen' | 'unseen';
  preconditions: Preconditions;
}

/**
 * Keeps a job under way as far as it has been written down. What is there already is answered as it stands, whatever the
 * sender had seen: a sending that is repeated because its answer was lost must not fail (RFC 9110, 13.1.1). Runs inside a
 * write.
 */
export function keepUnderWay(
  writer: UnderWayWriter,
  jobRef: string,
  sent: JobDraft,
  { money, preconditions }: Keeping,
  deed: UnderWayDeed,
): { status: 'created' | 'kept'; row: UnderWayRow } {
  const sentBy = writer.acceptance(jobRef);
  if (sentBy !== undefined) {
    throw new Refusal('conflict', `The job ${jobRef} has been sent already: ${sentBy}.`);
  }
  const former = writer.find(jobRef);
  const text = draftText(merged(sent, former, money));
  if (former?.text === text) return { status: 'kept', row: former };
  checkPreconditions(preconditions, former && { revision: former.revision, voided: false });
  if (!former && writer.count() >= MOST_UNDER_WAY) {
    const many = `${MOST_UNDER_WAY} jobs are under way at this branch, the most there can be`;
    throw new Refusal('conflict', `${many}; send or drop some of them first.`);
  }
  writer.keep(jobRef, text, former, deed);
  const row = writer.find(jobRef);
  if (!row) throw new Error('a job just kept is gone');
  return { status: former ? 'kept' : 'created', row };
}

function merged(
  sent: JobDraft,
  former: UnderWayRow | undefined,
  money: Keeping['money'],
): JobDraft {
  if (!former || money === 'seen') return sent;
  return keepMoneyUnderWay(sent, JSON.parse(former.text) as JobDraft);
}
