import type { MessagePort } from 'node:worker_threads';
import { workerData as piscinaData } from 'piscina';
import { BranchWriter } from '#db/branch-writer';
import { ClaimWriter } from '#db/claim-writer';
import { openReader } from '#db/database';
import { NetworkState } from '#db/network-state';
import { readImportCatalogue } from '#db/queries/imports';
import { Scope } from '#db/scope';
import { ScopedDb } from '#db/scoped-db';
import { checkFile } from '../features/imports/check-file';
import { FileProblem } from '../features/imports/file-problem';
import type { FileTask } from '../features/imports/import-tools';
import { rowsToWrite } from '../features/imports/rows-to-write';
import { worldOfRows } from '../features/imports/row-world';
import { ExportDemand } from './export-demand';

/** A file to be read, and what for. */
export type ImportTask = { file: FileTask } & ({ kind: 'check' } | { kind: 'rows'; after: number });

const { file: database } = piscinaData as { file: string };
const connection = openReader(database);

/** What piscina calls for each task; pieces go back through the port, one for each message sent into it, then null. */
export default async function work(task: ImportTask & { port: MessagePort }): Promise<void> {
  const { port } = task;
  const demand = new ExportDemand(port);
  try {
    for await (const piece of piecesOf(task)) {
      if (!(await demand.another())) return;
      port.postMessage(JSON.stringify(piece));
    }
    port.postMessage(null);
  } finally {
    port.close();
  }
}

async function* piecesOf(task: ImportTask): AsyncGenerator<object> {
  const { file } = task;
  if (task.kind === 'check') {
    yield* check(file);
    return;
  }
  try {
    yield* rowsToWrite(file, file.refusedPath, task.after);
  } catch (error) {
    if (!(error instanceof FileProblem)) throw error;
    yield { problem: error.message };
  }
}

function check(file: FileTask): AsyncGenerator<object> {
  const scope = Scope.unpack(file.scope);
  const branch = scope.branch(file.branch);
  if (!branch) throw new Error('a file is to be checked for a branch out of scope');
  const world = worldOfRows(file, readImportCatalogue(new ScopedDb(connection, scope)));
  // They only read here: the connection cannot write.
  const reading = { writing: connection, state: new NetworkState(connection) };
  const stored = {
    jobs: new BranchWriter(reading, branch),
    claims: new ClaimWriter(reading, branch),
  };
  return checkFile(file, file.refusedPath, world, stored);
}
