import type { MessagePort } from 'node:worker_threads';

/** Chunks on their way or waiting to be taken: enough that the worker does not wait for the wire, too few to fill the memory. */
const AHEAD = 4;

/** The near end of an export: its chunks in order, made as they are taken. Throws where the worker fails, so that a cut export never looks whole. */
export class ExportStream implements AsyncIterable<string> {
  private readonly arrived: (string | null)[] = [];
  private failure: Error | undefined;
  private wake: () => void = () => undefined;

  constructor(
    private readonly port: MessagePort,
    work: Promise<unknown>,
  ) {
    port.on('message', (chunk: string | null) => {
      this.arrived.push(chunk);
      this.wake();
    });
    work.catch((error: unknown) => {
      this.failure = error instanceof Error ? error : new Error('an export failed');
      this.wake();
    });
    for (let ahead = 0; ahead < AHEAD; ahead += 1) this.askForOne();
  }

  /** Wants no more; the worker stops at its next chunk. */
  cancel(): void {
    this.failure ??= new Error('an export was given up');
    this.port.close();
    this.wake();
  }

  async *[Symbol.asyncIterator](): AsyncGenerator<string, void> {
    try {
      for (;;) {
        const chunk = await this.next();
        if (chunk === null) return;
        yield chunk;
        this.askForOne();
      }
    } finally {
      this.port.close();
    }
  }

  private async next(): Promise<string | null> {
    while (this.arrived.length === 0) {
      if (this.failure) throw this.failure;
      await new Promise<void>((resolve) => {
        this.wake = resolve;
      });
    }
    return this.arrived.shift() as string | null;
  }

  private askForOne(): void {
    this.port.postMessage('one more');
  }
}
