import { Injectable } from '@angular/core';
import { newId } from './new-id';

/** Of what a note is: a job or a claim being written. */
export type AheadKind = 'job' | 'claim';

/** What is being written, and whose it is. */
export interface AheadPlace {
  readonly kind: AheadKind;
  readonly personId: number;
  readonly id: string;
}

/** A change that a window noted and did not see written. */
export interface AheadNote<Change> {
  readonly id: string;
  readonly change: Change;
  /** Forgets it: it is written, or there is nothing left to write it to. */
  readonly drop: () => void;
}

const PREFIX = 'underseam.ahead.';

/**
 * Notes of changes on their way into the device's database. That takes turns of its own, and a page that is opened anew, closed
 * or put away meanwhile takes them down with it; a note is left in the same turn, in local storage, and outlasts the page. Each
 * window has notes of its own and drops them once they are written; what is left is that of windows gone.
 */
@Injectable({ providedIn: 'root' })
export class WrittenAhead {
  private readonly window = newId();
  private readonly under = new Map<string, { change: unknown; writes: number }>();

  /** Leaves a note of a change until it is `written`; changes of one place still on their way are joined into one note. */
  async note<Change>(
    place: AheadPlace,
    change: Change,
    join: (earlier: Change, later: Change) => Change,
    written: Promise<unknown>,
  ): Promise<void> {
    const key = `${beginningOf(place)}${this.window}.${place.id}`;
    const earlier = this.under.get(key) as { change: Change; writes: number } | undefined;
    const note = {
      change: earlier ? join(earlier.change, change) : change,
      writes: (earlier?.writes ?? 0) + 1,
    };
    this.under.set(key, note);
    keep(key, note.change);
    await written.catch(() => undefined);
    const now = this.under.get(key);
    if (!now) return;
    now.writes -= 1;
    if (now.writes > 0) return;
    this.under.delete(key);
    drop(key);
  }

  /** What windows gone, and others still open, left of a person's. */
  left<Change>(kind: AheadKind, personId: number): AheadNote<Change>[] {
    return notesUnder({ kind, personId }).flatMap(({ key, window, id }) => {
      const change = window === this.window ? undefined : read<Change>(key);
      return change === undefined ? [] : [{ id, change, drop: () => drop(key) }];
    });
  }

  /** Drops every note of something taken off the device. */
  forget(place: AheadPlace): void {
    for (const { key, id } of notesUnder(place)) if (id === place.id) drop(key);
  }
}

function beginningOf({ kind, personId }: Omit<AheadPlace, 'id'>): string {
  return `${PREFIX}${kind}.${personId}.`;
}

function notesUnder(of: Omit<AheadPlace, 'id'>): { key: string; window: string; id: string }[] {
  const beginning = beginningOf(of);
  return keys().flatMap((key) => {
    if (!key.startsWith(beginning)) return [];
    const [window = '', ...id] = key.slice(beginning.length).split('.');
    return [{ key, window, id: id.join('.') }];
  });
}

function keys(): string[] {
  try {
    return Object.keys(localStorage);
  } catch {
    return [];
  }
}

function read<Change>(key: string): Change | undefined {
  try {
    return (JSON.parse(localStorage.getItem(key) ?? 'null') as Change | null) ?? undefined;
  } catch {
    return undefined;
  }
}

function keep(key: string, change: unknown): void {
  try {
    localStorage.setItem(key, JSON.stringify(change));
  } catch {
    // Storage is full or switched off: then the database alone has to do.
  }
}

function drop(key: string): void {
  try {
    localStorage.removeItem(key);
  } catch {
    // As above: there is none.
  }
}
