import BetterSqlite3 from 'better-sqlite3';
import { existsSync, statSync } from 'node:fs';
import { APPLICATION_ID, Connection, DatabaseRefused } from './database';
import { migrations } from './migrations';
import { verifyAudit, type AuditCheck } from './queries/audit';
import { firstEventAt } from './queries/audit-list';
import { PHOTO_TABLES } from './queries/photos';
import { UnscopedDb } from './unscoped-db';

/** What a checked database file holds. */
export interface DatabaseContents {
  bytes: number;
  jobs: number;
  auditEvents: number;
  /** Under which keys the photos' bytes lie, wherever they are kept. */
  photoKeys: string[];
}

/** Every page in one step: a copy in small steps starts again whenever another connection writes, and may never end. */
const ALL_PAGES = 0x7fffffff;

/**
 * Copies a database, even one that is being written to, as it stood at one instant, into a new file that needs no companion
 * files.
 */
export async function copyDatabase(from: string, to: string): Promise<void> {
  if (!existsSync(from)) throw new DatabaseRefused(`There is no database ${from}.`);
  const reader = look(from);
  try {
    await reader.backup(to, { progress: () => ALL_PAGES });
  } catch (error) {
    throw new DatabaseRefused(
      `The database ${from} could not be copied to ${to}: ${codeOf(error)}.`,
    );
  } finally {
    reader.close();
  }
  settle(to);
}

/** Checks a file from its first page to the last link of its audit trail; throws `DatabaseRefused` naming what is wrong. */
export function inspectDatabase(file: string): DatabaseContents {
  if (!existsSync(file)) throw new DatabaseRefused(`There is no file ${file}.`);
  const driver = look(file);
  try {
    if (driver.pragma('application_id', { simple: true }) !== APPLICATION_ID) {
      throw new DatabaseRefused(`The file ${file} is not an Underseam database.`);
    }
    if (Number(driver.pragma('user_version', { simple: true })) > migrations.length) {
      throw new DatabaseRefused(`The file ${file} was made by a newer Underseam.`);
    }
    const pages: unknown = driver.pragma('integrity_check(1)', { simple: true });
    const strays: unknown = driver.pragma('foreign_key_check');
    if (pages !== 'ok' || !Array.isArray(strays) || strays.length > 0) throw damaged(file);
    const trail = verifyAudit(new UnscopedDb(new Connection(driver)));
    if (trail.brokenAt !== null) throw brokenTrail(file, trail.brokenAt);
    const jobs = Number(driver.prepare('select count(*) from jobs').pluck().get());
    const photoKeys = photoKeysIn(driver);
    return { bytes: statSync(file).size, jobs, auditEvents: trail.events, photoKeys };
  } catch (error) {
    throw error instanceof DatabaseRefused ? error : damaged(file);
  } finally {
    driver.close();
  }
}

/** Checks the audit trail of a database, even one that is being written to; throws `DatabaseRefused` naming the first event that does not fit. */
export function inspectAudit(file: string): AuditCheck & { since: string | null } {
  if (!existsSync(file)) throw new DatabaseRefused(`There is no database ${file}.`);
  const driver = look(file);
  const db = new UnscopedDb(new Connection(driver));
  try {
    // One state of the trail, whatever is added to it meanwhile.
    return driver.transaction(() => {
      const trail = verifyAudit(db);
      if (trail.brokenAt !== null) throw brokenTrail(file, trail.brokenAt);
      return { ...trail, since: firstEventAt(db) };
    })();
  } catch (error) {
    throw error instanceof DatabaseRefused ? error : damaged(file);
  } finally {
    driver.close();
  }
}

/** Of jobs and of claims; a database of before there were photos of either has none. */
function photoKeysIn(driver: BetterSqlite3.Database): string[] {
  const known = driver.prepare('select 1 from sqlite_schema where name = ?');
  return Object.values(PHOTO_TABLES).flatMap(({ table }) => {
    if (known.get(table) === undefined) return [];
    return driver.prepare(`select storage_key from ${table}`).pluck().all() as string[];
  });
}

/**
 * Folds a database that nobody has open into its one file. Throws `DatabaseRefused` while any other program has it open; a
 * damaged one is left as it is, companions and all.
 */
export function closeDatabaseFile(file: string): void {
  if (!isReadable(file)) return;
  try {
    settle(file);
  } catch (error) {
    if (codeOf(error).startsWith('SQLITE_BUSY')) {
      throw new DatabaseRefused(`The database ${file} is in use; stop the server first.`);
    }
    if (!codeOf(error).startsWith('SQLITE_CORRUPT')) throw error;
  }
}

/** Runs one write on a file that no server has open. */
export function writeOnce(file: string, write: (db: UnscopedDb) => void): void {
  const connection = new Connection(new BetterSqlite3(file, { fileMustExist: true }));
  try {
    connection.driver.transaction(() => write(new UnscopedDb(connection)))();
  } finally {
    connection.close();
  }
}

/** Leaving WAL mode needs the file for oneself, writes everything into it and removes its companions. */
function settle(file: string): void {
  const driver = new BetterSqlite3(file, { fileMustExist: true, timeout: 500 });
  try {
    driver.pragma('journal_mode = delete');
  } finally {
    driver.close();
  }
}

/** Looks without writing: SQLite would clear away what a file that is no database has beside it. */
function isReadable(file: string): boolean {
  const reader = look(file);
  try {
    reader.prepare('select count(*) from sqlite_schema').get();
    return true;
  } catch (error) {
    if (!/^SQLITE_(NOTADB|CORRUPT)/.test(codeOf(error))) throw error;
    return false;
  } finally {
    reader.close();
  }
}

/** Opens a file that may be anything: read only, and not mapped into memory, where one cut short would end the process. */
function look(file: string): BetterSqlite3.Database {
  try {
    return new BetterSqlite3(file, { readonly: true, fileMustExist: true });
  } catch (error) {
    throw new DatabaseRefused(`The file ${file} cannot be opened: ${codeOf(error)}.`);
  }
}

/** The refusal that names the first event of a trail that does not fit. */
function brokenTrail(file: string, event: number): DatabaseRefused {
  return new DatabaseRefused(
    `The audit trail of ${file} does not hold: event ${event} does not follow from the one before it.`,
  );
}

function damaged(file: string): DatabaseRefused {
  return new DatabaseRefused(`The file ${file} is damaged or not a database.`);
}

/** SQLite's name of what went wrong. The driver's errors may come from another realm, where they are no `Error` of ours. */
function codeOf(error: unknown): string {
  return typeof error === 'object' && error !== null && 'code' in error
    ? String(error.code)
    : 'unknown reason';
}
