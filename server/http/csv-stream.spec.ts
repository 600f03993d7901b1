import { once } from 'node:events';
import express from 'express';
import { createServer, request, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { streamCsv, type CsvChunks } from './csv-stream';

let server: Server;
let outcome: Promise<unknown>;

/** Serves one export on a port of its own; `outcome` settles as `streamCsv` does. */
async function serve(chunks: CsvChunks, patienceMs?: number): Promise<number> {
  const app = express();
  outcome = new Promise((resolve) => {
    app.get('/', async (_request, response) => {
      try {
        await streamCsv(response, 'rows.csv', chunks, patienceMs);
        resolve('done');
      } catch (error) {
        resolve(error);
        if (!response.headersSent) response.status(500).end('told as a problem');
      }
    });
  });
  server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return (server.address() as AddressInfo).port;
}
afterEach(async () => {
  server.closeAllConnections();
  await new Promise((resolve) => server.close(resolve));
});

/** Chunks that tell whether they were given up, as the far end does by throwing. */
function chunksOf(make: () => AsyncGenerator<string>): CsvChunks & { cancelled: () => boolean } {
  let cancelled = false;
  let tell: (error: Error) => void = () => undefined;
  const gone = new Promise<never>((_resolve, reject) => (tell = reject));
  gone.catch(() => undefined);
  return {
    cancelled: () => cancelled,
    cancel: () => {
      cancelled = true;
      tell(new Error('given up'));
    },
    async *[Symbol.asyncIterator]() {
      const rows = make();
      for (;;) {
        const next = await Promise.race([rows.next(), gone]);
        if (next.done === true) return;
        yield next.value;
      }
    },
  };
}

/** Begins a download and hands over the response, its body not read yet. */
function open(port: number): Promise<IncomingMessage> {
  return new Promise((resolve, reject) => {
    request({ port, host: '127.0.0.1' }, resolve).on('error', reject).end();
  });
}
const MEGABYTE = 'x'.repeat(1 << 20);
async function* endless(): AsyncGenerator<string> {
  for (;;) {
    await new Promise(setImmediate);
    yield MEGABYTE;
  }
}

describe('streamCsv', () => {
  it('given chunks, sends them in order as a download', async () => {
    const port = await serve(
      chunksOf(async function* () {
        yield 'a,b\r\n';
        yield '1,2\r\n';
      }),
    );
    const answer = await fetch(`http://127.0.0.1:${port}/`);
    expect(await answer.text()).toBe('a,b\r\n1,2\r\n');
    expect(answer.headers.get('content-type')).toBe('text/csv; charset=utf-8; header=present');
    expect(answer.headers.get('content-disposition')).toBe('attachment; filename="rows.csv"');
    expect(await outcome).toBe('done');
  });

  it('given a failure before the first chunk, has sent nothing, so that it can be told', async () => {
    const port = await serve(
      chunksOf(async function* () {
        throw new Error('no rows');
        yield '';
      }),
    );
    const answer = await fetch(`http://127.0.0.1:${port}/`);
    expect([answer.status, await answer.text()]).toEqual([500, 'told as a problem']);
    expect(answer.headers.get('content-disposition')).toBeNull();
    expect(await outcome).toEqual(new Error('no rows'));
  });

  it('given a failure half-way, breaks the connection instead of ending it', async () => {
    const port = await serve(
      chunksOf(async function* () {
        yield 'a,b\r\n';
        await new Promise((resolve) => setTimeout(resolve, 20));
        throw new Error('half-way');
      }),
    );
    const answer = await fetch(`http://127.0.0.1:${port}/`);
    expect(answer.status).toBe(200);
    await expect(answer.text()).rejects.toThrow();
    expect(await outcome).toEqual(new Error('half-way'));
  });

  it('given a reader who leaves, ends the work and has nothing to tell', async () => {
    const chunks = chunksOf(endless);
    const download = await open(await serve(chunks));
    download.on('error', () => undefined).destroy();
    expect(await outcome).toBe('done');
    expect(chunks.cancelled()).toBe(true);
  });

  it('given a reader who leaves while the next chunk is made, does not wait for it', async () => {
    const chunks = chunksOf(async function* () {
      yield 'a,b\r\n';
      await new Promise(() => undefined);
    });
    const download = await open(await serve(chunks));
    download.on('error', () => undefined).destroy();
    expect(await outcome).toBe('done');
    expect(chunks.cancelled()).toBe(true);
  });

  it('given a reader who takes nothing, waits no longer than its patience and breaks the connection', async () => {
    const chunks = chunksOf(endless);
    const download = await open(await serve(chunks, 100));
    expect(await outcome).toEqual(new Error('the reader of an export took nothing for too long'));
    expect(chunks.cancelled()).toBe(true);
    await expect(once(download.resume(), 'end')).rejects.toThrow('aborted');
  });

  it('given a slow reader, makes no more than it takes', async () => {
    let made = 0;
    const chunks = chunksOf(async function* () {
      for await (const chunk of endless()) {
        made += 1;
        yield chunk;
      }
    });
    const download = await open(await serve(chunks));
    await new Promise((resolve) => setTimeout(resolve, 300));
    // What the sockets of both ends hold, a few megabytes, and not a chunk more.
    expect(made).toBeLessThan(20);
    download.on('error', () => undefined).destroy();
    await outcome;
  });
});
