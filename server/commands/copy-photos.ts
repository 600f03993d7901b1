import { copyFileSync, existsSync, mkdirSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { photoKey } from '../storage/photo-bytes';
import { putInPlace } from './put-in-place';

/**
 * Copies the photos of a folder into another that may hold some of them already. No key is ever used for other bytes, so what
 * is there is left as it is. A folder that is not there has none.
 */
export function copyPhotos(from: string, to: string): void {
  for (const branch of entriesOf(from)) {
    for (const name of entriesOf(path.join(from, branch))) {
      const target = path.join(to, branch, name);
      if (!name.endsWith('.jpg') || existsSync(target)) continue;
      mkdirSync(path.dirname(target), { recursive: true });
      const unfinished = `${target}.unfinished`;
      try {
        copyFileSync(path.join(from, branch, name), unfinished);
      } catch (error) {
        // Taken off meanwhile.
        if (!existsSync(path.join(from, branch, name))) continue;
        throw error;
      }
      putInPlace(unfinished, target);
    }
  }
}

/** How many of some photos have no bytes in a folder. */
export function missingPhotos(keys: readonly string[], folder: string): number {
  return keys.filter((key) => !existsSync(path.join(folder, photoKey(key, 'whole')))).length;
}

function entriesOf(folder: string): string[] {
  return existsSync(folder) ? readdirSync(folder) : [];
}
