import type { Scope } from '#db/scope';
import type { Store } from '#db/store';
import { answer } from '#server/workers/answers';
import { csvChunks } from '#server/workers/export-chunks';
import type { ExportName } from '#server/workers/read-tasks';
import type { ReadPool } from '#server/workers/read-pool';

/** What stands in for the pool of threads where a test must reach into the reading itself. */
export function readOnThisThread(store: Store): Pick<ReadPool, 'answer'> & { stream: unknown } {
  return {
    answer: async (name, scope, input) =>
      answer(name, store.scoped(scope), input as never, store.reference(scope)),
    stream: (name: ExportName, scope: Scope, input: unknown) => ({
      async *[Symbol.asyncIterator]() {
        yield* csvChunks(store.scoped(scope), name, input, store.reference(scope));
      },
      cancel: () => undefined,
    }),
  };
}
