import { MessageChannel } from 'node:worker_threads';
import type { Piscina } from 'piscina';
import type { Scope } from '#db/scope';
import { ExportStream } from './export-stream';
import type {
  ExportName,
  ExportTasks,
  PackedExport,
  PackedRead,
  ReadName,
  ReadTasks,
} from './read-tasks';
import { startThreads } from './start-threads';

/** Threads for answers, and others for exports, so that a slow download never holds up a page. */
const ANSWER_THREADS = 2;
const EXPORT_THREADS = 2;

/** Runs heavy reads and exports on threads with read-only connections of their own; nothing starts before the first one. */
export class ReadPool {
  private answers: Piscina | undefined;
  private exports: Piscina | undefined;

  constructor(private readonly file: string) {}

  /** Answers a question within a scope, from one state of the database. */
  async answer<Name extends ReadName>(
    name: Name,
    scope: Scope,
    input: ReadTasks[Name]['input'],
  ): Promise<ReadTasks[Name]['output']> {
    this.answers ??= this.threads(ANSWER_THREADS);
    const task: PackedRead = { kind: 'answer', name, scope: scope.pack(), input };
    return (await this.answers.run(task)) as ReadTasks[Name]['output'];
  }

  /** Begins an export within a scope, the whole of it from one state of the database. */
  stream<Name extends ExportName>(
    name: Name,
    scope: Scope,
    input: ExportTasks[Name],
  ): ExportStream {
    this.exports ??= this.threads(EXPORT_THREADS);
    const { port1, port2 } = new MessageChannel();
    const task: PackedExport = { kind: 'export', name, scope: scope.pack(), input, port: port2 };
    return new ExportStream(port1, this.exports.run(task, { transferList: [port2] }));
  }

  private threads(atMost: number): Piscina {
    return startThreads({ program: 'read-worker', atMost, data: { file: this.file } });
  }

  /** Ends the threads; what they still work on fails. */
  async close(): Promise<void> {
    await Promise.all([this.answers?.destroy(), this.exports?.destroy()]);
    this.answers = undefined;
    this.exports = undefined;
  }
}
