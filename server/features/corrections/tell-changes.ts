import { findRevision } from '#db/queries/corrections';
import { findSheet, listRevisions, toldRevision, type RevisionRow } from '#db/queries/job-sheet';
import type { ScopedDb } from '#db/scoped-db';
import type { getJobChanges } from '#shared/contracts/corrections';
import type { OutOf } from '#shared/contracts/endpoint';
import { jobChanges } from '#shared/domain/job-changes';
import { notFound } from '#shared/domain/refusal';

type JobChanges = OutOf<typeof getJobChanges>;

/** What is asked of a job: two of its revisions, by default the last two. */
export interface ChangesAsked {
  branch: string;
  jobRef: string;
  from?: number | undefined;
  to?: number | undefined;
}

/** Tells what changed between two revisions of a job, for one who sees money or one who does not. */
export function tellChanges(
  db: ScopedDb,
  { branch, jobRef, from, to }: ChangesAsked,
  money: 'seen' | 'unseen',
): JobChanges {
  return db.snapshot(() => {
    const sheet = findSheet(db, branch, jobRef);
    if (!sheet) throw notFound();
    const revisions = listRevisions(db, sheet.jobId);
    const marked = (revision: number): RevisionRow => {
      const found = revisions.find((row) => row.revision === revision);
      if (!found) throw notFound();
      return found;
    };
    const later = marked(to ?? sheet.revision);
    const earlier = from ?? later.revision - 1;
    const before = earlier === 0 ? undefined : marked(earlier);
    const contentOf = ({ revision }: RevisionRow) => findRevision(db, sheet.jobId, revision);
    const after = contentOf(later);
    if (!after) throw notFound();
    return {
      from: before ? toldRevision(before) : null,
      to: toldRevision(later),
      changes: jobChanges(before && contentOf(before), after, money),
    };
  });
}
