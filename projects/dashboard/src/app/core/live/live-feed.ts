import { DestroyRef, DOCUMENT, effect, inject, Injectable, signal, untracked } from '@angular/core';
import { Router } from '@angular/router';
import { followLive, liveEvent, type LiveEvent } from '#shared/contracts/live';
import { RETRY_PACE } from '../drafts/retry-pace';
import { Line } from '../offline/line';
import { Session } from '../session/session';
import { eventStreamReader, type StreamEvent } from './event-stream';

/** What a page hears: a change, or that some may have been missed and everything is to be read anew. */
export type LiveNote = LiveEvent | 'anew';
type Listener = (note: LiveNote) => void;

/** The stream is opened after what the page itself asks for at first, ms. */
const FIRST_WAIT = 1_000;
/** A server that has not begun to answer by then, ms, is still starting or hangs. */
const PATIENCE = 10_000;
/** Three breaths of the server without a sign, ms: the connection is dead though nobody said so. */
const LONGEST_SILENCE = 65_000;
/** A stream that lived so long, ms, ended as it should, with its token: the next is opened without a growing wait. */
const LIVED = 60_000;

/**
 * The window's one connection for live changes: open while somebody is signed in, the page is to be seen and something on it
 * listens. It is read with `fetch`, because a browser's own event source cannot carry the token. When it is lost it comes back
 * at growing waits and says that everything is to be read anew; nobody else is told.
 */
@Injectable({ providedIn: 'root' })
export class LiveFeed {
  private readonly document = inject(DOCUMENT);
  private readonly line = inject(Line);
  private readonly pace = inject(RETRY_PACE);
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  private readonly listeners = new Set<Listener>();
  private readonly wanted = signal(false);
  private readonly seen = signal(this.document.visibilityState !== 'hidden');
  private hasBeenOpen = false;

  constructor() {
    const look = (): void => this.seen.set(this.document.visibilityState !== 'hidden');
    this.document.addEventListener('visibilitychange', look);
    inject(DestroyRef).onDestroy(() => this.document.removeEventListener('visibilitychange', look));
    effect((onCleanup) => {
      // Once more when the browser says that the line is back: at once, not after the growing wait.
      this.line.returns();
      if (!this.wanted() || !this.seen() || !this.session.person()) return;
      const control = new AbortController();
      onCleanup(() => control.abort());
      untracked(() => void this.follow(control.signal));
    });
  }

  /** Hears of changes until the returned function is called; the first listener opens the connection. */
  listen(listener: Listener): () => void {
    this.listeners.add(listener);
    this.wanted.set(true);
    return () => this.listeners.delete(listener);
  }

  /** Opens the stream again and again until it is no longer wanted. */
  private async follow(signal: AbortSignal): Promise<void> {
    await pause(FIRST_WAIT, signal);
    for (let tries = 0; !signal.aborted;) {
      const begun = performance.now();
      // Without a line there is nothing to try: its return is told.
      if (navigator.onLine) await this.readOnce(signal).catch(() => undefined);
      tries = performance.now() - begun > LIVED ? 0 : tries + 1;
      await pause(tries === 0 ? FIRST_WAIT : this.pace(tries), signal);
    }
  }

  /** Opens the stream and hands on what comes until it ends; throws where the line broke. */
  private async readOnce(signal: AbortSignal): Promise<void> {
    const token = await this.session.usableToken();
    if (signal.aborted) return;
    if (!token) {
      this.leaveIfSignedOut();
      return;
    }
    const control = new AbortController();
    const stop = (): void => control.abort();
    signal.addEventListener('abort', stop);
    let silence = setTimeout(stop, PATIENCE);
    try {
      const response = await fetch(followLive.path, {
        headers: { Authorization: `Bearer ${token}`, Accept: 'text/event-stream' },
        cache: 'no-store',
        signal: control.signal,
      });
      if (response.status === 401) {
        await this.session.renew();
        this.leaveIfSignedOut();
      }
      if (!response.ok || !response.body) return;
      this.line.heard();
      const reader = response.body.getReader();
      const decoder = new TextDecoder();
      const read = eventStreamReader();
      for (;;) {
        const { done, value } = await reader.read();
        if (done) return;
        clearTimeout(silence);
        silence = setTimeout(stop, LONGEST_SILENCE);
        for (const event of read(decoder.decode(value, { stream: true }))) this.hear(event);
      }
    } finally {
      clearTimeout(silence);
      signal.removeEventListener('abort', stop);
      stop();
    }
  }

  private hear({ name, data }: StreamEvent): void {
    if (name === 'hello') {
      // What changed while there was no connection is not told again.
      if (this.hasBeenOpen) this.tell('anew');
      this.hasBeenOpen = true;
    }
    if (name !== 'change') return;
    const event = liveEvent.safeParse(parsed(data));
    // A newer server may say it otherwise; that something changed is certain.
    this.tell(event.success ? event.data : 'anew');
  }

  private tell(note: LiveNote): void {
    for (const listener of [...this.listeners]) listener(note);
  }

  /** As after any call that is answered 401: the sign-in has ended, here or elsewhere. */
  private leaveIfSignedOut(): void {
    if (!this.session.person()) this.session.end(this.router.url);
  }
}

function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

/** Settles after so long, or at once when aborted. */
function pause(milliseconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    if (signal.aborted) {
      resolve();
      return;
    }
    const done = (): void => {
      clearTimeout(timer);
      signal.removeEventListener('abort', done);
      resolve();
    };
    const timer = setTimeout(done, milliseconds);
    signal.addEventListener('abort', done);
  });
}
