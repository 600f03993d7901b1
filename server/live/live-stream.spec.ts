import { connect, type AddressInfo, type Socket } from 'node:net';
import express, { type Response } from 'express';
import { createServer, type Server } from 'node:http';
import { LiveStream } from './live-stream';

let server: Server;
let response: Response;
let begun: Promise<LiveStream>;

beforeEach(async () => {
  const app = express();
  begun = new Promise((resolve) => {
    app.get('/', (_, given) => {
      response = given;
      resolve(new LiveStream(given));
    });
  });
  server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});
afterEach(() => {
  server.closeAllConnections();
  server.close();
});

function ask(): Socket {
  const socket = connect((server.address() as AddressInfo).port, '127.0.0.1');
  socket.on('error', () => undefined);
  socket.write('GET / HTTP/1.1\r\nHost: here\r\n\r\n');
  return socket;
}
const event = { kind: 'jobs', branch: 'AAA', count: 1, added: 1 } as const;

describe('LiveStream', () => {
  it('given a reader that takes nothing, is cut off before much has piled up for them', async () => {
    const socket = ask();
    socket.pause();
    const stream = await begun;
    let most = 0;
    // The sockets between hold some megabytes of their own.
    for (let n = 0; n < 400_000 && !response.destroyed; n += 1) {
      stream.send(event);
      most = Math.max(most, response.writableLength);
      if (n % 500 === 0) await new Promise((resolve) => setImmediate(resolve));
    }
    await stream.over;
    expect(response.destroyed).toBe(true);
    expect(most).toBeLessThan(66 * 1024);
    socket.destroy();
  });

  it('given a reader that left, is over and takes no harm from what is still sent', async () => {
    const socket = ask();
    const stream = await begun;
    socket.destroy();
    await stream.over;
    expect(() => stream.send(event)).not.toThrow();
    expect(() => stream.breathe()).not.toThrow();
    expect(() => stream.end()).not.toThrow();
  });

  it('when ended, lets the reader have what was sent and then the end', async () => {
    const socket = ask();
    const stream = await begun;
    let text = '';
    socket.on('data', (data) => (text += data.toString()));
    stream.send(event);
    stream.end();
    await stream.over;
    while (!text.endsWith('0\r\n\r\n')) await new Promise((resolve) => setTimeout(resolve, 5));
    expect(text).toContain('data: {"kind":"jobs","branch":"AAA","count":1,"added":1}\n\n');
    socket.destroy();
  });
});
