import { readImportCatalogue } from '#db/queries/imports';
import type { ImportRecord } from '#db/queries/import-row';
import { Scope, type ScopedBranch } from '#db/scope';
import type { ScopedDb } from '#db/scoped-db';
import type { Store } from '#db/store';
import type { ImportFolder } from './import-folder';
import type { ImportSender } from './import-sender';
import type { FileTask, ImportTools } from './import-tools';
import { worldOfRows, type RowWorld } from './row-world';

/** What every piece of work on a branch's file needs. */
export interface ImportBench {
  store: Store;
  tools: ImportTools;
  folder: ImportFolder;
  branch: ScopedBranch;
}

/** A reader of the one branch's rows and of the catalogue. */
export function readerOf({ store, branch }: Pick<ImportBench, 'store' | 'branch'>): ScopedDb {
  return store.scoped(Scope.ofBranch(branch));
}

/** A file as a question to the thread that reads files. */
export function taskOf(
  { tools, folder, branch }: ImportBench,
  { id, kind, options, columns }: Pick<ImportRecord, 'id' | 'kind' | 'options' | 'columns'>,
  { claims }: ImportSender,
): FileTask {
  return {
    scope: Scope.ofBranch(branch).pack(),
    branch: branch.code,
    path: folder.fileOf(id),
    refusedPath: folder.refusedOf(id),
    kind,
    options,
    columns,
    today: tools.today(branch.timeZone),
    sender: claims,
  };
}

/** What the rows of a task are read and judged by, as things stand. */
export function worldOf(bench: ImportBench, task: FileTask): RowWorld {
  return worldOfRows(task, readImportCatalogue(readerOf(bench)));
}
