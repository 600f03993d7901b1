import 'fake-indexeddb/auto';
import { deserialize, serialize } from 'node:v8';
import { IDBFactory } from 'fake-indexeddb';
import type { DeviceStore } from '../core/drafts/device-store';

/** A browser copies what it stores; jsdom cannot by itself. */
globalThis.structuredClone ??= <T>(value: T): T => deserialize(serialize(value)) as T;

/** A device on which nothing has been kept yet. */
export function newDevice(): void {
  globalThis.indexedDB = new IDBFactory();
  localStorage.clear();
}

/** A device whose browser refuses to keep anything. */
export function refusingDevice(): void {
  newDevice();
  globalThis.indexedDB.open = () => {
    throw new DOMException('not in a private window', 'SecurityError');
  };
}

/** Lets a page go: what it asks of the device's database from here on is never done, nor answered. */
export function letGo(store: DeviceStore): void {
  store.update = () => new Promise(() => undefined);
}

/** Where changes are noted that have not been written yet. */
export function notedAhead(): string[] {
  return Object.keys(localStorage).filter((key) => key.startsWith('underseam.ahead.'));
}

const PNG = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 1, 2, 3];

/** A photo as a camera gives it, or a file of other bytes. */
export function photoFile(bytes: readonly number[] = PNG): Blob {
  const buffer = Uint8Array.from(bytes).buffer;
  const file = new Blob([buffer]);
  // What jsdom's files lack.
  return Object.assign(file, { arrayBuffer: () => Promise.resolve(buffer) });
}
