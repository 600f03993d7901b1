import { MessageChannel } from 'node:worker_threads';
import type { Piscina } from 'piscina';
import type { FileReader, FileTask } from '../features/imports/import-tools';
import { ExportStream } from './export-stream';
import type { ImportTask } from './import-worker';
import { startThreads } from './start-threads';

/** One for the file being checked and one for the file being written: a long one of either does not hold up the other. */
const THREADS = 2;

/** Reads sent files on threads with read-only connections of their own; nothing starts before the first file. */
export class ImportThread implements FileReader {
  private pool: Piscina | undefined;

  constructor(private readonly file: string) {}

  check(file: FileTask): ExportStream {
    return this.run({ kind: 'check', file });
  }

  rows({ after, ...file }: FileTask & { after: number }): ExportStream {
    return this.run({ kind: 'rows', file, after });
  }

  async close(): Promise<void> {
    await this.pool?.destroy();
    this.pool = undefined;
  }

  private run(task: ImportTask): ExportStream {
    this.pool ??= startThreads({
      program: 'import-worker',
      atMost: THREADS,
      data: { file: this.file },
    });
    const { port1, port2 } = new MessageChannel();
    const work = this.pool.run({ ...task, port: port2 }, { transferList: [port2] });
    return new ExportStream(port1, work);
  }
}
