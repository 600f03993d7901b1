import { chmodSync, existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import { copyDatabase, inspectDatabase, type DatabaseContents } from '#db/copy-database';
import { photoFolderOf } from '../storage/folder-photo-store';
import { CommandRefused } from './command';
import { copyPhotos, missingPhotos } from './copy-photos';
import { putInPlace } from './put-in-place';

/** The folder beside a backup that holds the photos of its data folder. */
export function photosBeside(backup: string): string {
  return `${backup}.photos`;
}

export interface TakenBackup extends DatabaseContents {
  /** The folder with the photos' bytes; undefined where the data folder has none. */
  photosIn: string | undefined;
  /** Photos whose bytes the data folder does not have. */
  missing: number;
}

/**
 * Copies the database of a data folder and its photos, while the server may be writing to it, and checks the copy whole
 * before it gets its name. Throws, leaving nothing behind, when the copy does not hold.
 */
export async function takeBackup(database: string, target: string): Promise<TakenBackup> {
  const beside = photosBeside(target);
  for (const [what, place] of [
    ['file', target],
    ['folder', beside],
  ] as const) {
    if (existsSync(place)) {
      throw new CommandRefused(`There is already a ${what} ${place}; name another one.`);
    }
  }
  mkdirSync(path.dirname(target), { recursive: true });
  const unfinished = `${target}.unfinished-${process.pid}`;
  const unfinishedPhotos = photosBeside(unfinished);
  const photos = photoFolderOf(path.dirname(database));
  try {
    // Before the database and once more after it, so that a photo taken off in between does not lack its bytes.
    copyPhotos(photos, unfinishedPhotos);
    await copyDatabase(database, unfinished);
    copyPhotos(photos, unfinishedPhotos);
    const contents = inspectDatabase(unfinished);
    const missing = missingPhotos(contents.photoKeys, unfinishedPhotos);
    // It holds people and what belongs to every branch.
    chmodSync(unfinished, 0o600);
    const photosIn = existsSync(unfinishedPhotos) ? beside : undefined;
    if (photosIn !== undefined) {
      chmodSync(unfinishedPhotos, 0o700);
      renameSync(unfinishedPhotos, photosIn);
    }
    putInPlace(unfinished, target);
    return { ...contents, photosIn, missing };
  } finally {
    for (const companion of ['', '-wal', '-shm', '-journal']) {
      rmSync(unfinished + companion, { force: true });
    }
    rmSync(unfinishedPhotos, { recursive: true, force: true });
  }
}
