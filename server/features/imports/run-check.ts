import { ImportWriter } from '#db/import-writer';
import type { ImportChange } from '#db/queries/import-row';
import type { CheckStep } from './check-file';
import type { ImportBench } from './import-bench';
import type { FileTask } from './import-tools';
import type { ImportWork } from './import-work';

/** Has a file checked and keeps what came of it. Never rejects: a file whose check breaks has `failed`. */
export async function runCheck(
  bench: ImportBench,
  id: string,
  task: FileTask,
  work: ImportWork,
): Promise<void> {
  const { store, tools, branch } = bench;
  const change = await checked(bench, task, work);
  // Closing leaves it as it is: the next start tells that it was interrupted.
  if (work.stop === 'close') return;
  const now = tools.now().toISOString();
  const kept: ImportChange =
    work.stop === 'cancel'
      ? { state: 'cancelled', endedAt: now }
      : { ...change, ...endOf(change, now) };
  await store.queue
    .write(() => new ImportWriter(store, branch).change(id, kept))
    .catch(() => undefined);
}

function endOf({ state }: ImportChange, now: string): ImportChange {
  return state === 'failed' ? { endedAt: now } : {};
}

async function checked(
  { tools }: ImportBench,
  task: FileTask,
  work: ImportWork,
): Promise<ImportChange> {
  if (work.stop) return {};
  const pieces = tools.reader.check(task);
  work.release = () => pieces.cancel();
  let last: CheckStep | undefined;
  try {
    for await (const text of pieces) {
      last = JSON.parse(text) as CheckStep;
      work.live = { done: last.done, of: last.of, counts: last.counts };
    }
  } catch {
    return { state: 'failed', problem: 'The check of this file broke off; have it checked again.' };
  }
  if (!last?.previews) {
    return { state: 'failed', problem: last?.problem ?? 'The check of this file broke off.' };
  }
  return { state: 'ready', counts: last.counts, rowsOf: last.of, ...last.previews };
}
