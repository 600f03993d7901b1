import { once } from 'node:events';
import { extname, join } from 'node:path';
import { MessageChannel, type MessagePort } from 'node:worker_threads';
import type { Response } from 'express';
import { Piscina } from 'piscina';
import type { Scope } from '#db/scope';
import type { ExportName, ExportTasks, ReadName, ReadTasks } from './read-tasks';

/** Workers for answers, and others for exports, so that a slow download never holds up a page. */
const ANSWER_THREADS = 2;
const EXPORT_THREADS = 2;

/** Runs heavy reads and exports on threads with read-only connections of their own; nothing starts before the first one. */
export class ReadPool {
  private answers: Piscina | undefined;
  private exports: Piscina | undefined;

  constructor(private readonly file: string) {}

  /** Answers a question within a scope. */
  async answer<Name extends ReadName>(
    name: Name,
    scope: Scope,
    input: ReadTasks[Name]['input'],
  ): Promise<ReadTasks[Name]['output']> {
    this.answers ??= startThreads(this.file, ANSWER_THREADS);
    return (await this.answers.run({
      kind: 'answer',
      name,
      scope: scope.pack(),
      input,
    })) as ReadTasks[Name]['output'];
  }

  /**
   * Streams an export into a response at the pace at which it is taken. A failure half-way breaks the connection, so that a
   * cut file never looks whole; a reader who leaves ends the work.
   */
  async stream<Name extends ExportName>(
    name: Name,
    scope: Scope,
    input: ExportTasks[Name],
    response: Response,
  ): Promise<void> {
    this.exports ??= startThreads(this.file, EXPORT_THREADS);
    const { port1, port2 } = new MessageChannel();
    const work = this.exports.run(
      { kind: 'export', name, scope: scope.pack(), input, port: port2 },
      { transferList: [port2] },
    );
    port1.on('message', (chunk: string) => void take(chunk, response, port1));
    response.once('close', () => port1.close());
    try {
      await work;
      response.end();
    } finally {
      port1.close();
    }
  }

  async close(): Promise<void> {
    await Promise.all([this.answers?.destroy(), this.exports?.destroy()]);
    this.answers = undefined;
    this.exports = undefined;
  }
}

/** Hands one chunk on and asks for the next when the reader has room. */
async function take(chunk: string, response: Response, port: MessagePort): Promise<void> {
  if (response.destroyed) return;
  if (!response.write(chunk))
    await Promise.race([once(response, 'drain'), once(response, 'close')]);
  port.postMessage('more');
}

function startThreads(file: string, threads: number): Piscina {
  const fromSource = __filename.endsWith('.ts');
  return new Piscina({
    filename: join(__dirname, `read-worker${extname(__filename)}`),
    workerData: { file },
    minThreads: 1,
    maxThreads: threads,
    idleTimeout: 60_000,
    // From source (tests, development) the thread reads TypeScript itself.
    execArgv: fromSource ? ['--import', 'tsx', '--conditions=underseam-source'] : [],
  });
}
