import { randomUUID } from 'node:crypto';
import { mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { PhotoStore } from './photo-store';

/** The folder of a data folder in which photos lie when no other store is set. */
export function photoFolderOf(data: string): string {
  return join(data, 'photos');
}

/** Photos as files below `photos` in the data folder. */
export class FolderPhotoStore implements PhotoStore {
  private readonly folder: string;

  constructor(data: string) {
    this.folder = photoFolderOf(data);
  }

  async put(key: string, bytes: Buffer): Promise<void> {
    const file = join(this.folder, key);
    await mkdir(dirname(file), { recursive: true });
    // Under a name of its own first: a stop in the middle must not leave half a photo under the key.
    const unfinished = `${file}.${randomUUID()}.unfinished`;
    try {
      await writeDurably(unfinished, bytes);
      await rename(unfinished, file);
    } catch (error) {
      await rm(unfinished, { force: true });
      throw error;
    }
    // Windows does not open folders, and keeps their entries by itself.
    if (process.platform !== 'win32') await syncPlace(dirname(file));
  }

  async get(key: string): Promise<Buffer | undefined> {
    try {
      return await readFile(join(this.folder, key));
    } catch (error) {
      if (isMissing(error)) return undefined;
      throw error;
    }
  }

  async remove(key: string): Promise<void> {
    await rm(join(this.folder, key), { force: true });
  }
}

async function writeDurably(file: string, bytes: Buffer): Promise<void> {
  const handle = await open(file, 'wx', 0o600);
  try {
    await handle.writeFile(bytes);
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function syncPlace(place: string): Promise<void> {
  const handle = await open(place, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** By its code only: errors of the file system may come from another realm, where they are no `Error` of ours. */
function isMissing(error: unknown): boolean {
  return typeof error === 'object' && error !== null && 'code' in error && error.code === 'ENOENT';
}
