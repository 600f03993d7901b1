import { once } from 'node:events';
import { workerData as piscinaData } from 'piscina';
import type { MessagePort } from 'node:worker_threads';
import { openReader } from '#db/database';
import { Scope } from '#db/scope';
import { ScopedDb } from '#db/scoped-db';
import { listJobs } from '../features/job-list/list-jobs';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';
import { csvChunks } from './export-chunks';
import type { PackedExport, PackedRead, ReadName, ReadTasks } from './read-tasks';

const { file } = piscinaData as { file: string };
const connection = openReader(file);

/** Every answer a worker knows, by name. */
const ANSWERS: {
  [Name in ReadName]: (db: ScopedDb, input: ReadTasks[Name]['input']) => ReadTasks[Name]['output'];
} = { margin: answerMargin, overrun: answerOverrun, jobs: listJobs };

/** What piscina calls for each task. */
export default async function work(task: PackedRead | PackedExport): Promise<unknown> {
  const db = new ScopedDb(connection, Scope.unpack(task.scope));
  if (task.kind === 'answer') return ANSWERS[task.name](db, task.input as never);
  const { port } = task as unknown as { port: MessagePort };
  await send(db, task, port);
  return undefined;
}

/** Sends an export chunk by chunk, each when the one before has been taken, on one unchanging state of the database. */
async function send(db: ScopedDb, task: PackedExport, port: MessagePort): Promise<void> {
  let gone = false;
  port.once('close', () => {
    gone = true;
  });
  connection.driver.exec('begin');
  try {
    for (const chunk of csvChunks(db, task)) {
      if (gone) return;
      port.postMessage(chunk);
      await Promise.race([once(port, 'message'), once(port, 'close')]);
    }
  } finally {
    connection.driver.exec('commit');
    port.close();
  }
}
