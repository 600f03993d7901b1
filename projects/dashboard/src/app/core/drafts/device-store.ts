import { Injectable, signal } from '@angular/core';
import { type DBSchema, type IDBPDatabase, openDB } from 'idb';
import type { ClaimDraft } from './claim-draft';
import type { DeviceDraft } from './device-draft';
import type { QueuedJob } from './queued-job';

/** A photo's bytes, apart from its draft, so that a draft changes without moving them. */
export interface KeptPhoto {
  readonly bytes: ArrayBuffer;
  readonly type: string;
}

interface Kept {
  drafts: DeviceDraft;
  photos: KeptPhoto;
  queue: QueuedJob;
  claims: ClaimDraft;
}
type Store = keyof Kept;
interface Schema extends DBSchema {
  drafts: { key: string; value: DeviceDraft };
  photos: { key: string; value: KeptPhoto };
  queue: { key: string; value: QueuedJob };
  claims: { key: string; value: ClaimDraft };
}

const STORES = ['drafts', 'photos', 'queue', 'claims'] as const;
const REFUSED =
  'This browser keeps nothing on this device for Underseam. What you write stays only while this page is open: send it before closing it.';
const FULL =
  'This device has no room left. What you write now stays only while this page is open: send it, or free some room.';

/** What is kept on this device, in IndexedDB; in memory, and said so, where the device refuses or is full. */
@Injectable({ providedIn: 'root' })
export class DeviceStore {
  private readonly said = signal<string | undefined>(undefined);
  private readonly memory = new Map<string, unknown>();
  private opened: Promise<IDBPDatabase<Schema> | undefined> | undefined;

  /** Why what is written may not outlast this page, or `undefined`. */
  readonly trouble = this.said.asReadonly();

  async get<S extends Store>(store: S, key: string): Promise<Kept[S] | undefined> {
    const held = this.memory.get(placeOf(store, key)) as Kept[S] | undefined;
    if (held !== undefined) return held;
    return (await this.database())?.get(store, key) as Promise<Kept[S] | undefined> | undefined;
  }

  async all<S extends Store>(store: S): Promise<Kept[S][]> {
    const db = await this.database();
    const found = new Map<string, Kept[S]>();
    if (db) {
      const [keys, values] = await Promise.all([db.getAllKeys(store), db.getAll(store)]);
      keys.forEach((key, index) => found.set(placeOf(store, key), values[index] as Kept[S]));
    }
    for (const [place, value] of this.memory) {
      if (place.startsWith(`${store} `)) found.set(place, value as Kept[S]);
    }
    return [...found.values()];
  }

  /** Changes one record by what is kept now, in one transaction, so that two windows never write over each other unseen. */
  async update<S extends Store>(
    store: S,
    key: string,
    change: (kept: Kept[S] | undefined) => Kept[S] | undefined,
  ): Promise<Kept[S] | undefined> {
    const place = placeOf(store, key);
    const db = await this.database();
    let next: Kept[S] | undefined;
    try {
      if (!db) throw new DOMException(REFUSED, 'InvalidStateError');
      const transaction = db.transaction(store, 'readwrite', { durability: 'strict' });
      // Its failure is that of the request within it, which is thrown below.
      transaction.done.catch(() => undefined);
      const held = this.memory.get(place) as Kept[S] | undefined;
      const stored = (await transaction.store.get(key)) as Kept[S] | undefined;
      next = change(held ?? stored);
      await (next === undefined ? transaction.store.delete(key) : transaction.store.put(next, key));
      await transaction.done;
      this.memory.delete(place);
      if (this.memory.size === 0) this.said.set(undefined);
    } catch (error) {
      if (!(error instanceof DOMException)) throw error;
      next ??= change(this.memory.get(place) as Kept[S] | undefined);
      if (next === undefined) this.memory.delete(place);
      else this.memory.set(place, next);
      if (next !== undefined) this.said.set(error.name === 'QuotaExceededError' ? FULL : REFUSED);
    }
    return next;
  }

  private database(): Promise<IDBPDatabase<Schema> | undefined> {
    this.opened ??= open().catch(() => {
      this.said.set(REFUSED);
      return undefined;
    });
    return this.opened;
  }
}

function placeOf(store: Store, key: string): string {
  return `${store} ${key}`;
}

/** Async, so that a browser that throws at the mere asking is refused like one that answers no. */
async function open(): Promise<IDBPDatabase<Schema>> {
  return openDB<Schema>('underseam', 2, {
    upgrade: (db) =>
      STORES.filter((store) => !db.objectStoreNames.contains(store)).forEach((store) =>
        db.createObjectStore(store),
      ),
    // A newer version of the product, open in another window, must not wait for this one.
    blocking: (_current, _blocked, event) => (event.target as IDBDatabase).close(),
  });
}
