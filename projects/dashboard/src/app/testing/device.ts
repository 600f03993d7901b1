import 'fake-indexeddb/auto';
import { deserialize, serialize } from 'node:v8';
import { IDBFactory } from 'fake-indexeddb';

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

const PNG = [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 1, 2, 3];

/** A photo as a camera gives it, or a file of other bytes. */
export function photoFile(bytes: readonly number[] = PNG): Blob {
  const buffer = Uint8Array.from(bytes).buffer;
  const file = new Blob([buffer]);
  // What jsdom's files lack.
  return Object.assign(file, { arrayBuffer: () => Promise.resolve(buffer) });
}
