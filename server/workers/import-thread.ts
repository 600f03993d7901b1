import { extname, join } from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import type { FileReader, FileTask } from '../features/imports/import-tools';
import { ExportStream } from './export-stream';
import type { ImportTask } from './import-worker';

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
    this.pool ??= startThreads(this.file);
    const { port1, port2 } = new MessageChannel();
    const work = this.pool.run({ ...task, port: port2 }, { transferList: [port2] });
    return new ExportStream(port1, work);
  }
}

function startThreads(file: string): Piscina {
  const fromSource = __filename.endsWith('.ts');
  const pool = new Piscina({
    filename: join(__dirname, `import-worker${extname(__filename)}`),
    workerData: { file },
    minThreads: 1,
    maxThreads: THREADS,
    idleTimeout: 60_000,
    // From source (tests, development) the thread reads TypeScript itself.
    execArgv: fromSource ? ['--import', 'tsx', '--conditions=underseam-source'] : [],
  });
  // A thread that dies at work fails its task, and the next task gets a new one; one that dies idle fails nobody.
  return pool.on('error', () => undefined);
}
