import type { BranchWriter } from '#db/branch-writer';
import type { FieldProblem } from '#shared/contracts/fields';
import { breaksOfJob, type JobWorld } from '#shared/domain/job-rules';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { notFound } from '#shared/domain/refusal';
import { acceptJob, type Accepted, type Sending } from '#db/accept-job';

/** Writes the bill of a finished car: a new revision that differs in the invoice only. Runs inside a write. */
export function writeBill(
  writer: BranchWriter,
  jobRef: string,
  invoice: NonNullable<RecordedJob['invoice']>,
  sending: Sending,
): Accepted {
  const stored = writer.findJob(jobRef);
  if (!stored || stored.voided) throw notFound();
  return acceptJob(writer, jobRef, { ...stored.content, invoice }, sending);
}

/** What the rules of a job say of the day of its bill, as pointers into the bill. */
export function breaksOfBill(bill: unknown, job: RecordedJob, world: JobWorld): FieldProblem[] {
  return breaksOfJob({ ...job, invoice: bill }, world)
    .filter(({ path }) => path === '/invoice/issuedOn')
    .map(({ message }) => ({ path: '/issuedOn', message }));
}
