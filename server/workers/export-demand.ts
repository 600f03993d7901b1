import type { MessagePort } from 'node:worker_threads';

/** What the taker of an export wants at this moment, told through a port: one message asks for one chunk, closing it asks for none. */
export class ExportDemand {
  private asked = 0;
  private gone = false;
  private wake: () => void = () => undefined;

  constructor(port: MessagePort) {
    port.on('message', () => {
      this.asked += 1;
      this.wake();
    });
    port.once('close', () => {
      this.gone = true;
      this.wake();
    });
  }

  /** Settles when another chunk is wanted (true) or none will be any more (false). */
  async another(): Promise<boolean> {
    while (this.asked === 0 && !this.gone) {
      await new Promise<void>((resolve) => {
        this.wake = resolve;
      });
    }
    this.asked -= 1;
    return !this.gone;
  }
}
