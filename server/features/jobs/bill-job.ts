import type { BranchWriter } from '#db/branch-writer';
import type { RecordedJob } from '#shared/domain/recorded-job';
import { notFound, refuseInput } from '#shared/domain/refusal';
import { acceptJob, type Accepted, type Sending } from './accept-job';

/** Writes the bill of a finished car: a new revision that differs in the invoice only. Runs inside a write. */
export function writeBill(
  writer: BranchWriter,
  jobRef: string,
  invoice: NonNullable<RecordedJob['invoice']>,
  today: string,
  sending: Sending,
): Accepted {
  const stored = writer.findJob(jobRef);
  if (!stored || stored.voided) throw notFound();
  if (invoice.issuedOn !== undefined && invoice.issuedOn > today) {
    throw refuseInput([
      { path: '/issuedOn', message: `lies in the future (today is ${today} at this branch)` },
    ]);
  }
  return acceptJob(writer, jobRef, { ...stored.content, invoice }, sending);
}
