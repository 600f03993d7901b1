import { copyFileSync, existsSync, linkSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import {
  closeDatabaseFile,
  copyDatabase,
  inspectDatabase,
  writeOnce,
  type DatabaseContents,
} from '#db/copy-database';
import { recordAudit } from '#db/queries/audit';
import { photoFolderOf } from '../storage/folder-photo-store';
import { CommandRefused } from './command';
import { copyPhotos, missingPhotos } from './copy-photos';
import { putInPlace } from './put-in-place';
import { photosBeside } from './take-backup';

/** What is done about a database that the data folder holds already. */
export type OldDatabase = 'refuse' | 'move-aside';

export interface Restored extends DatabaseContents {
  /** The folder in which the former database is kept, if there was one. */
  keptIn: string | undefined;
  /** Photos of the restored database whose bytes are neither beside the backup nor in the data folder. */
  missing: number;
}

/**
 * Puts a checked backup where a data folder's database is. The former database is kept in a folder beside it; up to the last
 * step the folder holds it as it was. Photos are added to those that are there and none is taken away, so that the former
 * database finds its own too. The restoring is written into the restored audit trail.
 */
export async function restoreBackup(
  backup: string,
  database: string,
  old: OldDatabase,
  now: Date,
): Promise<Restored> {
  inspectDatabase(backup);
  const stands = existsSync(database);
  if (stands) {
    if (path.resolve(backup) === path.resolve(database)) {
      throw new CommandRefused('The backup named is the database itself.');
    }
    closeDatabaseFile(database);
    if (old === 'refuse') {
      throw new CommandRefused(
        `The folder ${path.dirname(database)} holds a database already; add --move-aside to keep that one beside the restored one.`,
      );
    }
  }
  mkdirSync(path.dirname(database), { recursive: true });
  const unfinished = `${database}.unfinished-${process.pid}`;
  try {
    await copyDatabase(backup, unfinished);
    writeOnce(unfinished, (db) =>
      recordAudit(db, {
        at: now.toISOString(),
        actor: { label: 'system', personId: null, pushKeyId: null, address: 'local' },
        action: 'database.restore',
        subject: '/database',
        branchId: null,
        detail: { backup: path.basename(backup) },
      }),
    );
    const contents = inspectDatabase(unfinished);
    const photos = photoFolderOf(path.dirname(database));
    copyPhotos(photosBeside(backup), photos);
    const missing = missingPhotos(contents.photoKeys, photos);
    // Once more: a server may have been started meanwhile.
    if (stands) closeDatabaseFile(database);
    const keptIn = stands ? keep(database, now) : undefined;
    putInPlace(unfinished, database);
    return { ...contents, keptIn, missing };
  } finally {
    for (const companion of ['', '-wal', '-shm', '-journal']) {
      rmSync(unfinished + companion, { force: true });
    }
  }
}

/** Gives the former database a second name in a folder of its own, so that the first is never missing. */
function keep(database: string, now: Date): string {
  const stamp = now.toISOString().replace(/[-:]|\.\d+/g, '');
  const folder = path.join(path.dirname(database), `before-restore-${stamp}`);
  if (existsSync(folder)) throw new CommandRefused(`There is already a folder ${folder}.`);
  mkdirSync(folder);
  // A damaged database may have left these; beside the restored one they would spoil it.
  for (const companion of ['-wal', '-shm', '-journal']) {
    const file = database + companion;
    if (existsSync(file)) renameSync(file, path.join(folder, path.basename(file)));
  }
  const kept = path.join(folder, path.basename(database));
  try {
    linkSync(database, kept);
  } catch {
    // Some file systems give a file one name only.
    copyFileSync(database, kept);
  }
  return folder;
}
