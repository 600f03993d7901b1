import { ImportWriter } from '#db/import-writer';
import type { SentImport } from '#db/queries/imports';
import { worldOf, type ImportBench } from './import-bench';
import type { ImportSender } from './import-sender';
import type { EndedWriting, FileTask } from './import-tools';
import type { ImportWork } from './import-work';
import { keepRefused } from './refused-rows';
import type { RowsToWrite } from './rows-to-write';
import { writeRows, type Written } from './write-rows';

/**
 * Writes the good rows of a file a few at a time, other requests between them; how far it is stands in the same commit as the
 * rows. Never rejects: what breaks it off leaves the file `stopped`, and confirming it again goes on.
 */
export async function runWriting(
  bench: ImportBench,
  record: SentImport,
  task: FileTask,
  sender: ImportSender,
  work: ImportWork,
): Promise<void> {
  const end = await written(bench, record, task, sender, work);
  const { store, tools, branch } = bench;
  const at = tools.now().toISOString();
  await store.queue
    .write(() => {
      const writer = new ImportWriter(store, branch);
      writer.change(record.id, { ...end, endedAt: at });
      const ended = { ...record, ...writer.find(record.id) };
      const { kind, fileName, state, written: counts, rowsDone, rowsOf } = ended;
      const deed = { ...sender, at };
      const detail = { kind, fileName, state, written: counts, rowsDone, rowsOf };
      writer.tell('import.end', record.id, deed, detail);
      tools.tellEnded(sender.actor.personId, inWords(ended));
    })
    .catch(() => undefined);
}

const OUTCOMES: Partial<Record<SentImport['state'], string>> = {
  done: 'written',
  cancelled: 'cancelled; what was written stays',
  stopped: 'stopped; what was written stays, and it can be gone on with',
};

/** How the writing of a file has ended, for a mail. */
function inWords({ id, branch, fileName, state, written: counts }: SentImport): EndedWriting {
  const told = [
    [counts.created, 'new'],
    [counts.replaced, 'changed'],
    [counts.unchanged, 'unchanged'],
    [counts.refused, 'refused'],
  ] as const;
  return {
    branch,
    fileName,
    outcome: OUTCOMES[state] ?? state,
    counts: told.flatMap(([count, word]) => (count > 0 ? [`${count} ${word}`] : [])),
    path: `/import?branch=${branch}&file=${id}`,
  };
}

type End = Pick<SentImport, 'state' | 'problem'>;

async function written(
  bench: ImportBench,
  record: SentImport,
  task: FileTask,
  sender: ImportSender,
  work: ImportWork,
): Promise<End> {
  if (isStopped(work)) return endOf(work);
  const pieces = bench.tools.reader.rows({ ...task, after: record.rowsDone });
  work.release = () => pieces.cancel();
  let sum = record.written;
  try {
    const world = worldOf(bench, task);
    for await (const text of pieces) {
      const piece = JSON.parse(text) as RowsToWrite & { problem?: string };
      if (piece.problem !== undefined) return { state: 'stopped', problem: piece.problem };
      sum = await writePiece(bench, record, piece, sum, {
        by: sender.actor.personId,
        write: () =>
          writeRows(bench.store, bench.branch, piece.rows, world, {
            actor: sender.actor,
            source: 'file',
            receivedAt: bench.tools.now().toISOString(),
          }),
      });
      work.live = { done: piece.done, of: record.rowsOf };
      if (isStopped(work)) return endOf(work);
    }
  } catch {
    if (isStopped(work)) return endOf(work);
    const problem = 'The writing broke off; what was written stays. Confirm it again to go on.';
    return { state: 'stopped', problem };
  }
  return { state: 'done', problem: null };
}

/** One commit: some rows, and how far the file is with them. */
async function writePiece(
  { store, branch, folder }: ImportBench,
  { id }: SentImport,
  piece: RowsToWrite,
  before: Written,
  { by, write }: { by: number; write: () => ReturnType<typeof writeRows> },
): Promise<Written> {
  const done = await store.queue.write(() => {
    const { written, refused } = write();
    const sum: Written = {
      created: before.created + written.created,
      replaced: before.replaced + written.replaced,
      unchanged: before.unchanged + written.unchanged,
      refused: before.refused + written.refused + piece.refused,
    };
    new ImportWriter(store, branch).change(id, { rowsDone: piece.done, written: sum });
    return { sum, refused };
  }, by);
  keepRefused(folder.refusedOf(id), done.refused);
  return done.sum;
}

/** Asked anew each time: it is set from elsewhere. */
function isStopped({ stop }: ImportWork): boolean {
  return stop !== undefined;
}

function endOf({ stop }: ImportWork): End {
  return { state: stop === 'cancel' ? 'cancelled' : 'stopped', problem: null };
}
