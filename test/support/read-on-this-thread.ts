import type { Scope } from '#db/scope';
import type { Store } from '#db/store';
import { listJobs } from '#server/features/job-list/list-jobs';
import { answerMargin } from '#server/features/margin/answer-margin';
import { answerOverrun } from '#server/features/overrun/answer-overrun';
import { csvChunks } from '#server/workers/export-chunks';
import type { ReadPool } from '#server/workers/read-pool';

/** What stands in for the pool of threads where a test must reach into the reading itself. */
export function readOnThisThread(store: Store): Pick<ReadPool, 'answer'> & { stream: unknown } {
  const answers = { margin: answerMargin, overrun: answerOverrun, jobs: listJobs };
  return {
    answer: async (name, scope, input) => answers[name](store.scoped(scope), input as never),
    stream: (name: 'margin' | 'overrun' | 'jobs', scope: Scope, input: unknown) => ({
      async *[Symbol.asyncIterator]() {
        yield* csvChunks(store.scoped(scope), name, input);
      },
      cancel: () => undefined,
    }),
  };
}
