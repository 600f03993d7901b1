import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { TextDecoder, TextEncoder } from 'node:util';
import { RETRY_PACE } from '../drafts/retry-pace';
import { Line } from '../offline/line';
import { Session } from '../session/session';
import { LiveFeed, type LiveNote } from './live-feed';

const HELLO = 'retry: 5000\nevent: hello\ndata: {}\n\n';
const CHANGE = { kind: 'jobs', branch: 'HAV', count: 2, added: 1 } as const;
const told = (event: object): string => `id: 1\nevent: change\ndata: ${JSON.stringify(event)}\n\n`;

/** A stream that a spec writes, as `fetch` gives it. */
class Stream {
  private pending: ((result: { done: boolean; value?: Uint8Array }) => void) | undefined;
  private readonly queue: { done: boolean; value?: Uint8Array }[] = [];
  private broken: ((reason: unknown) => void) | undefined;

  constructor(
    readonly headers: Record<string, string>,
    readonly signal: AbortSignal,
  ) {
    signal.addEventListener('abort', () => this.broken?.(new Error('aborted')));
  }
  write(text: string): void {
    this.give({ done: false, value: new TextEncoder().encode(text) });
  }
  end(): void {
    this.give({ done: true });
  }
  get response(): unknown {
    const read = () =>
      new Promise((resolve, reject) => {
        this.broken = reject;
        const next = this.queue.shift();
        if (next) resolve(next);
        else this.pending = resolve;
      });
    return { status: 200, ok: true, body: { getReader: () => ({ read }) } };
  }
  private give(result: { done: boolean; value?: Uint8Array }): void {
    if (this.pending) this.pending(result);
    else this.queue.push(result);
    this.pending = undefined;
  }
}

function set(answers: ('stream' | 'no line' | 401 | 502)[] = []) {
  const person = signal<{ id: number } | undefined>({ id: 7 });
  let tokens = 0;
  const session = {
    person,
    usableToken: () => Promise.resolve(`token ${(tokens += 1)}`),
    renew: jest.fn(() => Promise.resolve(undefined)),
    end: jest.fn(),
  };
  const streams: Stream[] = [];
  const asked: number[] = [];
  globalThis.fetch = ((
    _: string,
    init: { headers: Record<string, string>; signal: AbortSignal },
  ) => {
    asked.push(performance.now());
    const answer = answers.shift() ?? 'stream';
    if (answer === 'no line') return Promise.reject(new TypeError('no line'));
    if (answer !== 'stream') return Promise.resolve({ status: answer, ok: false, body: null });
    const stream = new Stream(init.headers, init.signal);
    streams.push(stream);
    return Promise.resolve(stream.response);
  }) as unknown as typeof fetch;
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      { provide: Session, useValue: session },
      { provide: RETRY_PACE, useValue: (tries: number) => tries * 2_000 },
    ],
  });
  const feed = TestBed.inject(LiveFeed);
  const heard: LiveNote[] = [];
  const leave = feed.listen((note) => heard.push(note));
  const pass = async (milliseconds: number): Promise<void> => {
    TestBed.tick();
    await jest.advanceTimersByTimeAsync(milliseconds);
    TestBed.tick();
  };
  return { asked, feed, heard, leave, pass, person, session, streams };
}

const show = (state: 'visible' | 'hidden'): void => {
  Object.defineProperty(document, 'visibilityState', { value: state, configurable: true });
  document.dispatchEvent(new Event('visibilitychange'));
};

beforeEach(() => {
  jest.useFakeTimers();
  Object.assign(globalThis, { TextDecoder });
});
afterEach(() => {
  show('visible');
  TestBed.resetTestingModule();
  jest.useRealTimers();
});

describe('LiveFeed', () => {
  it('given a listener, opens one stream with the token and hands on what it says', async () => {
    const { feed, heard, pass, streams } = set();
    feed.listen(() => undefined);
    await pass(1_000);
    expect(streams).toHaveLength(1);
    expect(streams[0]!.headers).toMatchObject({ Authorization: 'Bearer token 1' });
    streams[0]!.write(HELLO + told(CHANGE));
    await pass(0);
    expect(heard).toEqual([CHANGE]);
  });

  it('given an event cut in two and one it cannot read, misses neither', async () => {
    const { heard, pass, streams } = set();
    await pass(1_000);
    const [first, second] = [told(CHANGE).slice(0, 30), told(CHANGE).slice(30)];
    streams[0]!.write(HELLO + first);
    await pass(0);
    expect(heard).toEqual([]);
    streams[0]!.write(second + told({ kind: 'other' }));
    await pass(0);
    expect(heard).toEqual([CHANGE, 'anew']);
  });

  it('given nobody who listens any more, tells nobody', async () => {
    const { heard, leave, pass, streams } = set();
    await pass(1_000);
    leave();
    streams[0]!.write(HELLO + told(CHANGE));
    await pass(0);
    expect(heard).toEqual([]);
  });

  it('given a stream that ends with its token, opens the next with a fresh one and has all read anew', async () => {
    const { heard, pass, streams } = set();
    await pass(1_000);
    streams[0]!.write(HELLO);
    for (let breath = 0; breath < 30; breath += 1) {
      await pass(20_000);
      streams[0]!.write(':\n\n');
    }
    streams[0]!.end();
    await pass(1_000);
    expect(streams[1]!.headers).toMatchObject({ Authorization: 'Bearer token 2' });
    expect(heard).toEqual([]);
    streams[1]!.write(HELLO);
    await pass(0);
    expect(heard).toEqual(['anew']);
  });

  it('given no answer or a refusing one, tries again at growing waits', async () => {
    const { asked, pass } = set(['no line', 502, 'no line', 'stream']);
    await pass(20_000);
    const waits = asked.slice(1).map((at, n) => Math.round(at - asked[n]!));
    expect(waits).toEqual([2_000, 4_000, 6_000]);
  });

  it('given a server that does not begin to answer, gives up after ten seconds and tries again', async () => {
    const { pass, streams } = set();
    await pass(1_000);
    await pass(10_000);
    expect(streams[0]!.signal.aborted).toBe(true);
    await pass(2_000);
    expect(streams).toHaveLength(2);
  });

  it('given silence beyond three breaths, gives the connection up and comes back', async () => {
    const { pass, streams } = set();
    await pass(1_000);
    streams[0]!.write(HELLO);
    await pass(64_000);
    expect(streams[0]!.signal.aborted).toBe(false);
    await pass(2_000);
    expect(streams[0]!.signal.aborted).toBe(true);
    await pass(3_000);
    expect(streams).toHaveLength(2);
  });

  it('given a page that is not to be seen, holds no stream; seen again, reads anew', async () => {
    const { heard, pass, streams } = set();
    await pass(1_000);
    streams[0]!.write(HELLO);
    await pass(0);
    show('hidden');
    await pass(60_000);
    expect(streams[0]!.signal.aborted).toBe(true);
    expect(streams).toHaveLength(1);
    show('visible');
    await pass(1_000);
    streams[1]!.write(HELLO);
    await pass(0);
    expect(heard).toEqual(['anew']);
  });

  it('given a sign-out, closes the stream and opens none', async () => {
    const { pass, person, session, streams } = set();
    await pass(1_000);
    person.set(undefined);
    await pass(60_000);
    expect(streams[0]!.signal.aborted).toBe(true);
    expect(streams).toHaveLength(1);
    expect(session.end).not.toHaveBeenCalled();
  });

  it('given a sign-in that has ended elsewhere, asks to sign in as any call does', async () => {
    const { pass, person, session } = set([401]);
    session.renew.mockImplementation(() => {
      person.set(undefined);
      return Promise.resolve(undefined);
    });
    await pass(1_000);
    await pass(0);
    expect(session.renew).toHaveBeenCalledTimes(1);
    expect(session.end).toHaveBeenCalledTimes(1);
  });

  it('given a line that the browser says is back, tries at once', async () => {
    const { pass, streams } = set(['no line', 'no line', 'no line', 'stream']);
    await pass(12_000);
    expect(streams).toHaveLength(0);
    window.dispatchEvent(new Event('online'));
    await pass(1_000);
    expect(streams).toHaveLength(1);
    expect(TestBed.inject(Line).down()).toBe(false);
  });
});
