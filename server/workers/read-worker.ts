import { workerData as piscinaData } from 'piscina';
import { openReader } from '#db/database';
import { Scope } from '#db/scope';
import { ScopedDb } from '#db/scoped-db';
import { listJobs } from '../features/job-list/list-jobs';
import { answerMargin } from '../features/margin/answer-margin';
import { answerOverrun } from '../features/overrun/answer-overrun';
import { csvChunks } from './export-chunks';
import { ExportDemand } from './export-demand';
import type { PackedExport, PackedRead, ReadName, ReadTasks } from './read-tasks';

const { file } = piscinaData as { file: string };
const connection = openReader(file);

/** Every answer a worker knows, by name. */
const ANSWERS: {
  [Name in ReadName]: (db: ScopedDb, input: ReadTasks[Name]['input']) => ReadTasks[Name]['output'];
} = { margin: answerMargin, overrun: answerOverrun, jobs: listJobs };

/** What piscina calls for each task, one at a time. */
export default async function work(task: PackedRead | PackedExport): Promise<unknown> {
  const db = new ScopedDb(connection, Scope.unpack(task.scope));
  if (task.kind === 'answer') return ANSWERS[task.name](db, task.input as never);
  await send(db, task);
  return undefined;
}

/** Sends an export chunk by chunk as they are asked for, the whole of it from one unchanging state of the database. */
async function send(db: ScopedDb, { name, input, port }: PackedExport): Promise<void> {
  const demand = new ExportDemand(port);
  connection.prepare('begin').run();
  try {
    for (const chunk of csvChunks(db, name, input)) {
      if (!(await demand.another())) return;
      port.postMessage(chunk);
    }
    port.postMessage(null);
  } finally {
    // Nothing was written: this only lets go of the state that was read.
    connection.prepare('rollback').run();
    port.close();
  }
}
