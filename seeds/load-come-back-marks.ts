import { BranchWriter } from '#db/branch-writer';
import { ComeBackWriter, type Mark } from '#db/come-back-writer';
import { breaksOfMark } from '#shared/domain/come-back-rules';
import type { DemoComeBackMark } from './demo-network';
import type { LaterEvent, Loading } from './load-history';

/** The marks of a branch's list as later events, each written after the ones before it. Runs inside a write. */
export function markEvents(loading: Loading, marks: readonly DemoComeBackMark[]): LaterEvent[] {
  const { store, branch, senders, world } = loading;
  const jobs = new BranchWriter(store, branch);
  const writer = new ComeBackWriter(store, branch);
  const last = new Map<string, { mark: Mark; revision: number }>();
  return marks.map(({ jobRef, ref, mark, changedAt }) => ({
    at: changedAt,
    happen: () => {
      const job = jobs.findJob(jobRef);
      if (!job) throw new Error(`the demo marks a job that it does not have: ${jobRef}`);
      const [broken] = breaksOfMark(mark, job.content.completedOn, world.today);
      if (broken) throw new Error(`the demo's mark of ${jobRef} breaks a rule: ${broken.message}`);
      const before = last.get(`${jobRef} ${ref}`);
      const revision = before?.revision ?? 0;
      const found = { job_id: job.id, job_ref: jobRef, ref, revision };
      writer.mark(found, mark, before?.mark ?? null, { actor: senders.marker, at: changedAt });
      last.set(`${jobRef} ${ref}`, { mark, revision: revision + 1 });
    },
  }));
}
