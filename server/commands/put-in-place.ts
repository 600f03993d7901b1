import { closeSync, fsyncSync, openSync, renameSync } from 'node:fs';
import path from 'node:path';

/** Gives a finished file of the same folder its name in one step, and sees to it that both outlast a power cut. */
export function putInPlace(finished: string, target: string): void {
  sync(finished);
  renameSync(finished, target);
  // Windows does not open folders, and keeps their entries by itself.
  if (process.platform !== 'win32') sync(path.dirname(target));
}

function sync(place: string): void {
  const handle = openSync(place, 'r');
  try {
    fsyncSync(handle);
  } finally {
    closeSync(handle);
  }
}
