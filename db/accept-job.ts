import type { BranchWriter, Receipt, StoredJob } from './branch-writer';
import { breaksOfReferences, INVOICE_TOTAL_MISSING } from '#shared/domain/job-rules';
import { normaliseJob, referenced, type SentJob } from '#shared/domain/normalise-job';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { refuseInput } from '#shared/domain/refusal';
import { checkPreconditions, type Preconditions } from '#shared/domain/preconditions';
import { breaksOfClaims } from './breaks-of-claims';
import { keepMoneyUnderWay, keepStoredMoney } from '#shared/domain/keep-stored-money';

/** How a job is sent: by whom, and whether what they leave out of its money is kept. */
export interface Sending extends Receipt {
  money: 'seen' | 'unseen';
  preconditions: Preconditions;
}

export interface Accepted {
  jobRef: string;
  revision: number;
  status: 'created' | 'unchanged' | 'replaced';
  voided?: boolean;
}

/** What taking a job would do: nothing is written yet. */
export type JudgedJob = { job: RecordedJob; text: string } & (
  { status: 'created'; stored: undefined } | { status: 'unchanged' | 'replaced'; stored: StoredJob }
);

/** What of the record a job is judged by. */
export type JobRecord = Pick<BranchWriter, 'findJob' | 'firstClaimOn'>;

/**
 * Takes a job that has passed the rules into the record: creates it, keeps it as it is, or makes a new revision. Runs inside
 * a write, so that the stored job it is compared with cannot change meanwhile.
 */
export function acceptJob(
  writer: BranchWriter,
  jobRef: string,
  sent: SentJob,
  sending: Sending,
): Accepted {
  const whole = withMoneyUnderWay(writer, jobRef, sent, sending.money);
  const { status, stored, job, text } = judgeJob(writer, jobRef, whole, sending);
  if (status === 'created') {
    refuseGone(writer, job);
    writer.createJob(jobRef, job, text, sending);
    return { jobRef, revision: 1, status };
  }
  if (status === 'unchanged') {
    // A nightly re-push must not revive what was voided (rule 25).
    return { jobRef, revision: stored.revision, status, ...(stored.voided && { voided: true }) };
  }
  refuseGone(writer, job);
  const revision = writer.replaceJob(jobRef, stored, job, text, sending);
  return { jobRef, revision, status };
}

/** A product or package may have been taken out of the catalogue since the job was judged. */
function refuseGone({ state }: BranchWriter, job: RecordedJob): void {
  const gone = breaksOfReferences(job, {
    isProduct: (code) => state.productId(code) !== undefined,
    isPackage: (code) => state.package(code) !== undefined,
  });
  if (gone.length > 0) throw refuseInput(gone);
}

/** With what a colleague who sees money wrote down while the job was under way: it ends with this, and a recorder cannot send it. */
function withMoneyUnderWay(
  writer: BranchWriter,
  jobRef: string,
  sent: SentJob,
  money: Sending['money'],
): SentJob {
  const underWay = money === 'unseen' ? writer.findUnderWay(jobRef) : undefined;
  return underWay ? keepMoneyUnderWay(named(sent), underWay) : sent;
}

/** What taking a job that has passed the rules would do; the preview of a file and the write itself both ask here. */
export function judgeJob(
  record: JobRecord,
  jobRef: string,
  sent: SentJob,
  { money, preconditions }: Pick<Sending, 'money' | 'preconditions'>,
): JudgedJob {
  const stored = record.findJob(jobRef);
  checkPreconditions(preconditions, stored);
  const job = merged(sent, stored?.content, money);
  const text = JSON.stringify(job);
  if (!stored) return { status: 'created', stored, job, text };
  if (stored.text === text) return { status: 'unchanged', stored, job, text };
  const late = breaksOfClaims(record, jobRef, job);
  if (late.length > 0) throw refuseInput(late);
  return { status: 'replaced', stored, job, text };
}

/** The job to keep: what was sent, with the stored invoice when none was sent (rule 73) and, for a recorder, the stored money. */
function merged(
  sent: SentJob,
  stored: RecordedJob | undefined,
  money: Sending['money'],
): RecordedJob {
  const whole = stored && money === 'unseen' ? keepStoredMoney(named(sent), stored) : sent;
  const invoice = whole.invoice === undefined ? stored?.invoice : (whole.invoice ?? undefined);
  if (invoice && invoice.totalCents === undefined) {
    throw refuseInput([INVOICE_TOTAL_MISSING]);
  }
  return normaliseJob({
    ...whole,
    invoice: invoice as RecordedJob['invoice'],
  });
}

/** The job with every finding's reference, by which stored money is found again. */
function named(sent: SentJob): SentJob {
  return { ...sent, findings: sent.findings && referenced(sent.findings) };
}
