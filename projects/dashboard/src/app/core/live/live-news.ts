import { LiveAnnouncer } from '@angular/cdk/a11y';
import { DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { LiveEvent } from '#shared/contracts/live';
import { formatTime } from '../../ui/format';
import { Catalogue } from '../catalogue/catalogue';
import { liveSentence } from './live-sentence';

/** Between two announcements, ms: what comes in meanwhile is said together. */
const APART = 10_000;
/** So long the line stays to be read, ms. */
const SHOWN = 20_000;

/** Says in words what has come in and is shown now: a quiet line, and once, politely, to those who hear the page. */
@Injectable({ providedIn: 'root' })
export class LiveNews {
  private readonly announcer = inject(LiveAnnouncer);
  private readonly catalogue = inject(Catalogue);
  private readonly said = signal<string | undefined>(undefined);
  /** Several readings of a page tell of the same event. */
  private readonly known = new WeakSet<LiveEvent>();
  private waiting: LiveEvent[] = [];
  private announcing: ReturnType<typeof setTimeout> | undefined;
  private hiding: ReturnType<typeof setTimeout> | undefined;
  private lastAt = -Infinity;

  /** What was said last, for as long as it is worth reading. */
  readonly line = this.said.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => {
      clearTimeout(this.announcing);
      clearTimeout(this.hiding);
    });
  }

  /** Tells of changes that the page shows by now; what the person did themselves was told where they did it. */
  tell(events: readonly LiveEvent[]): void {
    const fresh = events.filter((event) => event.own !== true && !this.known.has(event));
    if (fresh.length === 0) return;
    for (const event of fresh) this.known.add(event);
    this.waiting.push(...fresh);
    const wait = Math.max(0, this.lastAt + APART - performance.now());
    this.announcing ??= setTimeout(() => this.announce(), wait);
  }

  private announce(): void {
    this.announcing = undefined;
    this.lastAt = performance.now();
    const sentence = liveSentence(this.waiting, {
      time: formatTime(new Date()),
      branchName: (code) => this.catalogue.branchName(code),
    });
    this.waiting = [];
    this.said.set(sentence);
    void this.announcer.announce(sentence, 'polite');
    clearTimeout(this.hiding);
    this.hiding = setTimeout(() => this.said.set(undefined), SHOWN);
  }
}
