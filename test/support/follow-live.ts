import type { LiveEvent } from '#shared/contracts/live';
import type { TestApp } from './app';

/** An open stream of live changes, read as it comes. */
export interface Following {
  status: number;
  headers: Headers;
  /** Everything that came so far. */
  text: () => string;
  /** The changes that came so far. */
  changes: () => LiveEvent[];
  /** Waits until so many changes have come. */
  until: (count: number) => Promise<LiveEvent[]>;
  /** Settles when the server has ended or broken the stream. */
  over: Promise<void>;
  /** Leaves. */
  leave: () => void;
}

const PATIENCE_MS = 5_000;

/** Opens the stream as a person and waits until it has begun. */
export async function followLive(app: TestApp, token: string): Promise<Following> {
  const control = new AbortController();
  const response = await fetch(`${app.url}/api/live`, {
    headers: { authorization: `Bearer ${token}`, accept: 'text/event-stream' },
    signal: control.signal,
  });
  let text = '';
  let ended = false;
  const read = async (): Promise<void> => {
    const decoder = new TextDecoder();
    try {
      const reader = response.body!.getReader();
      for (;;) {
        const { done, value } = await reader.read();
        if (done) break;
        text += decoder.decode(value, { stream: true });
      }
    } catch {
      // Left or broken off: either way it is over.
    }
    ended = true;
  };
  const over = read();
  const changes = (): LiveEvent[] =>
    [...text.matchAll(/^event: change\ndata: (.+)$/gm)].map(([, data]) => JSON.parse(data!));
  const wait = async (done: () => boolean): Promise<void> => {
    const start = Date.now();
    while (!done()) {
      if (ended || Date.now() - start > PATIENCE_MS)
        throw new Error(`waited in vain, got: ${text}`);
      await new Promise((resolve) => setTimeout(resolve, 5));
    }
  };
  await wait(() => text.includes('event: hello'));
  return {
    status: response.status,
    headers: response.headers,
    text: () => text,
    changes,
    until: async (count) => {
      await wait(() => changes().length >= count);
      return changes();
    },
    over,
    leave: () => control.abort(),
  };
}
