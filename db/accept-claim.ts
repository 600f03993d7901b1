import type { Receipt } from './branch-writer';
import type { ClaimWriter, DecidedClaim, RecordedClaim, StoredClaim } from './claim-writer';
import type { ClaimContent } from '#shared/contracts/claims';
import { Refusal, refuseInput } from '#shared/domain/refusal';
import type { ClaimDecision, Role } from '#shared/domain/vocabulary';
import { breaksAgainstJob } from './breaks-against-job';

/** Who sends a claim and what they may decide (rule 77). */
export interface ClaimSending extends Receipt {
  /** A push key decides like a site manager. */
  role: Role;
  /** The network's limit in cents, or null when there is none. */
  limitCents: number | null;
  /** Judges the conditional headers against the stored revision, when there are any. */
  precondition?: (stored: StoredClaim | undefined) => void;
}

export interface AcceptedClaim {
  claimRef: string;
  revision: number;
  status: 'created' | 'unchanged' | 'replaced';
  decision: ClaimDecision;
  proposedDecision?: ClaimDecision;
}

/** What taking a claim would do: nothing is written yet. */
export interface JudgedClaim {
  status: AcceptedClaim['status'];
  stored: StoredClaim | undefined;
  claim: DecidedClaim;
  jobId: number;
}

/** What of the record a claim is judged by. */
export type ClaimRecord = Pick<ClaimWriter, 'findClaim' | 'findJob'>;

/** Takes a claim whose own fields have passed the rules into the record. Runs inside a write. */
export function acceptClaim(
  writer: ClaimWriter,
  claimRef: string,
  sent: ClaimContent,
  sending: ClaimSending,
): AcceptedClaim {
  const { status, stored, claim, jobId } = judgeClaim(writer, claimRef, sent, sending);
  if (stored && status === 'unchanged') return told(claimRef, stored.revision, status, claim);
  const revision = writer.keepClaim(claimRef, jobId, stored, claim, sending);
  return told(claimRef, revision, status, claim);
}

/** What taking a claim that has passed the rules would do; the preview of a file and the write itself both ask here. */
export function judgeClaim(
  record: ClaimRecord,
  claimRef: string,
  sent: ClaimContent,
  sending: Pick<ClaimSending, 'role' | 'limitCents' | 'precondition'>,
): JudgedClaim {
  const stored = record.findClaim(claimRef);
  sending.precondition?.(stored);
  const job = record.findJob(sent.jobRef);
  const problems = breaksAgainstJob(record, sent);
  if (!job || problems.length > 0) throw refuseInput(problems);
  const content = normaliseClaim(sent, stored?.content, sending.role);
  const claim = decided(content, stored, sending);
  const same =
    stored?.text === claim.text &&
    stored.decision === claim.decision &&
    stored.proposed === claim.proposed;
  const status = same ? 'unchanged' : stored ? 'replaced' : 'created';
  return { status, stored, claim, jobId: job.id };
}

function normaliseClaim(
  sent: ClaimContent,
  stored: RecordedClaim | undefined,
  role: Role,
): RecordedClaim {
  const keeps = role === 'recorder' ? stored : undefined;
  const cost = sent.costCents ?? keeps?.costCents;
  const { decidedOn = keeps?.decidedOn, paidOn = keeps?.paidOn } = sent;
  return {
    jobRef: sent.jobRef,
    madeOn: sent.madeOn,
    zone: sent.zone,
    ...(sent.side !== undefined && { side: sent.side }),
    cause: sent.cause,
    decision: sent.decision,
    ...(decidedOn !== undefined && { decidedOn }),
    ...(sent.labourMinutes > 0 && { labourMinutes: sent.labourMinutes }),
    ...(sent.productMl > 0 && { productMl: sent.productMl }),
    ...(cost !== undefined && cost > 0 && { costCents: cost }),
    ...(paidOn !== undefined && { paidOn }),
    ...(sent.note && { note: sent.note.normalize('NFC') }),
  };
}

/**
 * Which decision counts (rule 77): a recorder's changes none; above the limit only head office decides, so that another's is a
 * proposal, and a cost raised there is a claim to decide anew.
 */
function decided(
  sent: RecordedClaim,
  stored: StoredClaim | undefined,
  { role, limitCents }: Pick<ClaimSending, 'role' | 'limitCents'>,
): DecidedClaim {
  const cost = sent.costCents ?? 0;
  const above = role !== 'head_office' && limitCents !== null && cost > limitCents;
  const raised = above && cost > (stored?.content.costCents ?? 0);
  const before = stored?.decision ?? 'open';
  const standing = raised ? 'open' : before;
  if (role === 'recorder') {
    if (sent.decision !== 'open' && sent.decision !== before) {
      throw new Refusal(
        'forbidden',
        'A recorder leaves a claim open or as it was decided; the site manager decides it.',
      );
    }
    if (redated(sent, stored?.content)) {
      throw new Refusal('forbidden', 'When a claim was decided and paid is not for recorders.');
    }
    const content = { ...sent, decision: stored?.content.decision ?? 'open' };
    const waiting = stored?.proposed ?? (raised && before !== 'open' ? before : null);
    return kept(content, standing, waiting);
  }
  if (!above) return kept(sent, sent.decision, null);
  const asks = sent.decision !== 'open' && sent.decision !== standing;
  return kept(sent, standing, asks ? sent.decision : null);
}

/** Whether a claim that was decided, or proposed to be, has other days of it. */
function redated(sent: RecordedClaim, stored: RecordedClaim | undefined): boolean {
  if (!stored || stored.decision === 'open') return false;
  return sent.decidedOn !== stored.decidedOn || sent.paidOn !== stored.paidOn;
}

function kept(
  content: RecordedClaim,
  decision: ClaimDecision,
  proposed: ClaimDecision | null,
): DecidedClaim {
  return { content, text: JSON.stringify(content), decision, proposed };
}

function told(
  claimRef: string,
  revision: number,
  status: AcceptedClaim['status'],
  { decision, proposed }: Pick<DecidedClaim, 'decision' | 'proposed'>,
): AcceptedClaim {
  return {
    claimRef,
    revision,
    status,
    decision,
    ...(proposed !== null && { proposedDecision: proposed }),
  };
}
