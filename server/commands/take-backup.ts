import { chmodSync, existsSync, mkdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { copyDatabase, inspectDatabase, type DatabaseContents } from '#db/copy-database';
import { CommandRefused } from './command';
import { putInPlace } from './put-in-place';

/**
 * Copies the database of a data folder, while the server may be writing to it, and checks the copy whole before it gets its
 * name. Throws, leaving nothing behind, when the copy does not hold.
 */
export async function takeBackup(database: string, target: string): Promise<DatabaseContents> {
  if (existsSync(target)) {
    throw new CommandRefused(`There is already a file ${target}; name another one.`);
  }
  mkdirSync(path.dirname(target), { recursive: true });
  const unfinished = `${target}.unfinished-${process.pid}`;
  try {
    await copyDatabase(database, unfinished);
    const contents = inspectDatabase(unfinished);
    // It holds people and what belongs to every branch.
    chmodSync(unfinished, 0o600);
    putInPlace(unfinished, target);
    return contents;
  } finally {
    for (const companion of ['', '-wal', '-shm', '-journal']) {
      rmSync(unfinished + companion, { force: true });
    }
  }
}
