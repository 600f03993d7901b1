import { basename } from 'node:path';
import { ImportWriter, importsToKeep, stopInterruptedImports } from '#db/import-writer';
import type { SentImport } from '#db/queries/imports';
import type { ImportRecord } from '#db/queries/import-row';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import type { ImportKind, ReadingOptions } from '#shared/contracts/imports';
import { headingKey } from '#shared/domain/import-field';
import { notFound } from '#shared/domain/refusal';
import { readerOf, taskOf, type ImportBench } from './import-bench';
import { ImportFolder } from './import-folder';
import { refuseConfirming, refuseCorrecting, refuseGone } from './import-refusals';
import type { ImportSender } from './import-sender';
import type { ImportTools } from './import-tools';
import { ImportWorks } from './import-work';
import { inspectFile } from './inspect-file';
import { planFile } from './plan-file';
import { runCheck } from './run-check';
import { runWriting } from './run-writing';
import type { LiveProgress } from './tell-import';

/** Bytes of files are kept so long after they ended. */
const KEPT_DAYS = 30;
const DAY_MS = 86_400_000;

/** How a person says a file is to be read; columns by their place. */
export interface Correction {
  options: ReadingOptions;
  columns: ReadonlyMap<number, string | null>;
}

/** Checks and writes the files that branches send: of each one at a time, and other requests between the rows. */
export class ImportDesk {
  readonly folder: ImportFolder;
  private readonly works = new ImportWorks();

  constructor(
    private readonly store: Store,
    private readonly tools: ImportTools,
  ) {
    this.folder = new ImportFolder(tools.folder);
  }

  /** Tells of files that a stop of the server interrupted, and lets go of old ones. */
  async start(): Promise<void> {
    const now = this.tools.now();
    const before = new Date(now.getTime() - KEPT_DAYS * DAY_MS).toISOString();
    await this.store.queue.write(() => stopInterruptedImports(this.store, now.toISOString()));
    this.folder.keepOnly(new Set(importsToKeep(this.store, before)));
  }

  /** Stops what is under way; what is written stays. */
  async close(): Promise<void> {
    await this.works.stopAll();
    await this.tools.reader.close();
  }

  /** How far the work on a file is, while there is some. */
  liveOf(id: string): LiveProgress | undefined {
    return this.works.of(id)?.live;
  }

  /** Settles when the work on a file has ended, or after some time. */
  async settled(id: string, waitMs: number): Promise<void> {
    const work = this.works.of(id);
    if (!work) return;
    let timer: NodeJS.Timeout | undefined;
    const waited = new Promise<void>((resolve) => (timer = setTimeout(resolve, waitMs)));
    await Promise.race([work.ended, waited]);
    clearTimeout(timer);
  }

  /** Takes a received file in, guesses how it is to be read, and begins its check. Refuses (422) what is no CSV. */
  async receive(
    branch: ScopedBranch,
    kind: ImportKind,
    received: { path: string; name: string; bytes: number },
    sender: ImportSender,
  ): Promise<string> {
    const inspected = await inspectFile(received.path);
    // The folder for incoming files has given it a name that no other has.
    const id = basename(received.path);
    const at = { branch: branch.code, kind, at: sender.at };
    const record: Omit<ImportRecord, 'branchId'> = {
      id,
      kind,
      fileName: received.name.slice(0, 200),
      storedFile: `${id}.csv`,
      bytes: received.bytes,
      sha256: inspected.sha256,
      receivedAt: sender.at,
      personId: sender.actor.personId,
      ...(await planFile(readerOf({ store: this.store, branch }), at, inspected)),
    };
    this.folder.take(id, received.path);
    await this.store.queue.write(() => new ImportWriter(this.store, branch).add(record));
    if (record.state === 'checking') this.beginCheck(branch, record, sender);
    return id;
  }

  /** Reads a file anew as a person says, remembers what its headings mean to the branch, and begins its check. */
  async correct(
    branch: ScopedBranch,
    id: string,
    said: Correction,
    sender: ImportSender,
  ): Promise<void> {
    const before = this.found(branch, id);
    refuseCorrecting(before);
    refuseGone(this.folder.has(id));
    await this.works.stop(id, 'cancel');
    const inspected = await inspectFile(this.folder.fileOf(id));
    const at = { branch: branch.code, kind: before.kind, at: sender.at };
    const db = readerOf({ store: this.store, branch });
    const planned = await planFile(db, at, inspected, said.options);
    // Where another delimiter parts them, other columns stand: what was said of the old ones does not fit.
    const parted = said.options.delimiter !== before.options.delimiter;
    const columns = parted ? planned.columns : chosen(planned.columns, said.columns);
    await this.store.queue.write(() => {
      const writer = new ImportWriter(this.store, branch);
      refuseCorrecting(writer.find(id));
      writer.change(id, { ...planned, columns });
      for (const [index, { heading, field }] of columns.entries()) {
        if (field === planned.columns[index]?.field) continue;
        writer.remember(before.kind, headingKey(heading), field);
      }
    });
    if (planned.state === 'checking') {
      this.beginCheck(branch, { ...before, ...planned, columns }, sender);
    }
  }

  /** Begins to write the good rows of a file, or goes on with what is missing. */
  async confirm(branch: ScopedBranch, id: string, sender: ImportSender): Promise<void> {
    const record = await this.store.queue.write(() => {
      const writer = new ImportWriter(this.store, branch);
      const found = writer.find(id);
      refuseConfirming(found);
      refuseGone(this.folder.has(id));
      writer.change(id, { state: 'writing', endedAt: null, problem: null });
      const { kind, fileName, counts, rowsDone } = found;
      writer.tell('import.write', id, sender, { kind, fileName, counts, after: rowsDone });
      return found;
    });
    const bench = this.bench(branch);
    const task = taskOf(bench, record, sender);
    const live = { done: record.rowsDone, of: record.rowsOf };
    this.works.begin('write', id, live, (work) => runWriting(bench, record, task, sender, work));
  }

  /** Stops the check or the writing of a file and settles when it has ended; what is written stays. */
  async cancel(branch: ScopedBranch, id: string, { at }: ImportSender): Promise<void> {
    this.found(branch, id);
    await this.works.stop(id, 'cancel');
    await this.store.queue.write(() => {
      const writer = new ImportWriter(this.store, branch);
      if (writer.find(id)?.state !== 'ready') return;
      writer.change(id, { state: 'cancelled', endedAt: at });
    });
  }

  private beginCheck(
    branch: ScopedBranch,
    record: Pick<ImportRecord, 'id' | 'kind' | 'options' | 'columns'>,
    sender: ImportSender,
  ): void {
    const bench = this.bench(branch);
    const task = taskOf(bench, record, sender);
    this.works.begin('check', record.id, { done: 0, of: null }, (work) =>
      runCheck(bench, record.id, task, work),
    );
  }

  private bench(branch: ScopedBranch): ImportBench {
    return { store: this.store, tools: this.tools, folder: this.folder, branch };
  }

  private found(branch: ScopedBranch, id: string): SentImport {
    const found = new ImportWriter(this.store, branch).find(id);
    if (!found) throw notFound();
    return found;
  }
}

/** The columns with what a person says of them. */
function chosen(
  columns: ImportRecord['columns'],
  said: Correction['columns'],
): ImportRecord['columns'] {
  return columns.map((column) => {
    const field = said.get(column.index);
    if (field === undefined || field === column.field) return column;
    return { ...column, field, chosen: true };
  });
}
