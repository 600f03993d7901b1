import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { PhotoStore } from './photo-store';

/** Photos as files below `photos` in the data folder. */
export class FolderPhotoStore implements PhotoStore {
  private readonly folder: string;

  constructor(data: string) {
    this.folder = join(data, 'photos');
  }

  async put(key: string, bytes: Buffer): Promise<void> {
    const file = join(this.folder, key);
    await mkdir(dirname(file), { recursive: true });
    await writeFile(file, bytes);
  }

  async get(key: string): Promise<Buffer | undefined> {
    return readFile(join(this.folder, key)).catch(() => undefined);
  }

  async remove(key: string): Promise<void> {
    await rm(join(this.folder, key), { force: true });
  }
}
