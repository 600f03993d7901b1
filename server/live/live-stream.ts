import type { Response } from 'express';
import type { LiveEvent } from '#shared/contracts/live';

/** A browser that lost the line tries again after so long, ms, unless it knows better. */
const RETRY_MS = 5_000;
/** More than this unread, in bytes, and the reader is let go: it comes back and reads anew. */
const MOST_UNREAD = 64 * 1024;
/** After this a reader who has not taken the end of a stream is let go. */
const PARTING_MS = 2_000;

/**
 * One answer that stays open: `text/event-stream` as the WHATWG's HTML standard has it (server-sent events). Events are
 * numbered from 1 within the stream, so that a number says nothing of what others are told.
 */
export class LiveStream {
  private sent = 0;
  /** Settles when either side has ended it. */
  readonly over: Promise<void>;

  constructor(private readonly response: Response) {
    this.over = new Promise((resolve) => response.once('close', resolve));
    response
      .status(200)
      // The second tells a reverse proxy to pass each event on at once.
      .set({ 'Content-Type': 'text/event-stream', 'X-Accel-Buffering': 'no' });
    this.write(`retry: ${RETRY_MS}\nevent: hello\ndata: {}\n\n`);
    if (response.req.method === 'HEAD') response.end();
  }

  send(event: LiveEvent): void {
    this.sent += 1;
    this.write(`id: ${this.sent}\nevent: change\ndata: ${JSON.stringify(event)}\n\n`);
  }

  /** A comment that keeps the connection from looking idle. */
  breathe(): void {
    this.write(':\n\n');
  }

  /** Ends it; one that does not read is cut off, because its end would never arrive. */
  end(): void {
    this.response.end();
    setTimeout(() => this.response.destroy(), PARTING_MS).unref();
  }

  private write(text: string): void {
    if (this.response.destroyed || this.response.writableEnded) return;
    this.response.write(text);
    if (this.response.writableLength > MOST_UNREAD) this.response.destroy();
  }
}
