import { workerData as piscinaData } from 'piscina';
import { openReader } from '#db/database';
import { NetworkReference } from '#db/network-reference';
import { Scope } from '#db/scope';
import { ScopedDb } from '#db/scoped-db';
import { answer } from './answers';
import { csvChunks } from './export-chunks';
import { ExportDemand } from './export-demand';
import type { PackedExport, PackedRead } from './read-tasks';

const { file } = piscinaData as { file: string };
const connection = openReader(file);

/** What piscina calls for each task, one at a time. */
export default async function work(task: PackedRead | PackedExport): Promise<unknown> {
  const scope = Scope.unpack(task.scope);
  const db = new ScopedDb(connection, scope);
  if (task.kind === 'answer') {
    return answer(task.name, db, task.input as never, new NetworkReference(connection, scope));
  }
  await send(db, task);
  return undefined;
}

/** Sends an export chunk by chunk as they are asked for, the whole of it from one unchanging state of the database. */
async function send(db: ScopedDb, { name, input, port }: PackedExport): Promise<void> {
  const demand = new ExportDemand(port);
  connection.prepare('begin').run();
  try {
    for (const chunk of csvChunks(db, name, input, new NetworkReference(connection, db.scope))) {
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
