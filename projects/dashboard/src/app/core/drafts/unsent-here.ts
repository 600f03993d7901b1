import { computed, DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';
import { Session } from '../session/session';

/** Jobs of one person on this device that the server does not have yet. */
export interface Unsent {
  /** Being written. */
  readonly editing: number;
  /** Handed over or refused, and photos of jobs sent. */
  readonly waiting: number;
}

const KEY = 'underseam.unsent';
const NOTHING: Unsent = { editing: 0, waiting: 0 };

/**
 * How much of a person's work lies unsent on this device. Counted by the drafts and left where it is read at once, so that a
 * page need not load what sends them to know that there is nothing to send.
 */
@Injectable({ providedIn: 'root' })
export class UnsentHere {
  private readonly session = inject(Session);
  private readonly counts = signal(read());

  /** Of the person signed in. */
  readonly mine = computed(() => this.counts()[this.session.person()?.id ?? 0] ?? NOTHING);

  constructor() {
    const view = inject(DOCUMENT).defaultView;
    const follow = (event: StorageEvent): void => {
      if (event.key === KEY) this.counts.set(read());
    };
    view?.addEventListener('storage', follow);
    inject(DestroyRef).onDestroy(() => view?.removeEventListener('storage', follow));
  }

  count(personId: number, unsent: Unsent): void {
    const { [personId]: before = NOTHING, ...others } = this.counts();
    if (before.editing === unsent.editing && before.waiting === unsent.waiting) return;
    const none = unsent.editing === 0 && unsent.waiting === 0;
    this.counts.set(none ? others : { ...others, [personId]: unsent });
    try {
      localStorage.setItem(KEY, JSON.stringify(this.counts()));
    } catch {
      // Storage is switched off: then nothing outlasts this page, and the drafts say so.
    }
  }
}

function read(): Readonly<Record<number, Unsent | undefined>> {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(KEY) ?? '{}');
    return typeof kept === 'object' && kept !== null ? (kept as Record<number, Unsent>) : {};
  } catch {
    return {};
  }
}
