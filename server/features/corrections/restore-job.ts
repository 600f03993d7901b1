import type { BranchWriter, Receipt } from '#db/branch-writer';
import type { OutOf } from '#shared/contracts/endpoint';
import type { restoreJob as contract } from '#shared/contracts/corrections';
import { checkPreconditions } from '#shared/domain/preconditions';
import { notFound } from '#shared/domain/refusal';

/**
 * Brings a voided job back as it was (rule 25): into every figure, with its claims and marks. Not a revision. Runs inside a
 * write; `ifMatch` names the revision that the caller saw voided.
 */
export function restoreJob(
  writer: BranchWriter,
  jobRef: string,
  ifMatch: string | undefined,
  receipt: Receipt,
): OutOf<typeof contract> {
  const stored = writer.findJob(jobRef);
  if (!stored?.voided) throw notFound();
  checkPreconditions(
    { ifMatch, ifNoneMatch: undefined, lastChange: () => writer.lastChange(jobRef) },
    // To be restored is to be there: it is compared with the revision it had.
    { revision: stored.revision, voided: false },
  );
  writer.restoreJob(jobRef, stored, receipt);
  return { jobRef, revision: stored.revision };
}
