import BetterSqlite3 from 'better-sqlite3';
import knexFactory, { type Knex } from 'knex';
import { existsSync, rmSync } from 'node:fs';
import { migrations, migrationSource } from './migrations';

/** Marks a SQLite file as Underseam's ("USea" in ASCII). */
export const APPLICATION_ID = 0x55536561;

/** A problem with the data folder or file that a person must solve; its message is one clear sentence. */
export class DatabaseRefused extends Error {}

/** The knex query builder, used to write SQL only: statements run on a `Connection`. */
export const sql: Knex = knexFactory({ client: 'better-sqlite3', useNullAsDefault: true });

type Statement = BetterSqlite3.Statement<unknown[], unknown>;
export type Query = Knex.QueryBuilder | Knex.Raw;

/**
 * One SQLite connection. Everything on it is synchronous, so a transaction can never be interleaved with another request's
 * statements. Statements are prepared once and kept by their text.
 */
export class Connection {
  private readonly statements = new Map<string, Statement>();

  constructor(readonly driver: BetterSqlite3.Database) {}

  /** All rows of a query. */
  all<Row>(query: Query): Row[] {
    const { sql: text, bindings } = query.toSQL().toNative();
    return this.prepare(text).all(...(bindings as unknown[])) as Row[];
  }

  /** Rows one at a time; the connection must not be used for anything else meanwhile. */
  iterate<Row>(query: Query): IterableIterator<Row> {
    const { sql: text, bindings } = query.toSQL().toNative();
    return this.driver.prepare(text).iterate(...(bindings as unknown[])) as IterableIterator<Row>;
  }

  /** The first row of a query, or `undefined`. */
  first<Row>(query: Query): Row | undefined {
    const { sql: text, bindings } = query.toSQL().toNative();
    return this.prepare(text).get(...(bindings as unknown[])) as Row | undefined;
  }

  /** Runs a write; returns how many rows changed and the last row id. */
  run(query: Query): { changes: number; id: number } {
    const { sql: text, bindings } = query.toSQL().toNative();
    const done = this.prepare(text).run(...(bindings as unknown[]));
    return { changes: done.changes, id: Number(done.lastInsertRowid) };
  }

  /** A prepared statement, made once for its text: for the hot paths. */
  prepare(text: string): Statement {
    let statement = this.statements.get(text);
    if (!statement) {
      statement = this.driver.prepare(text);
      this.statements.set(text, statement);
    }
    return statement;
  }

  close(): void {
    this.statements.clear();
    this.driver.close();
  }
}

/** Checks the file, brings it to the newest migration and opens the one writing connection. Refuses without touching a corrupt, foreign or newer file. */
export async function openDatabase(file: string): Promise<Connection> {
  if (existsSync(file)) inspect(file);
  await migrate(file);
  const connection = open(() => new BetterSqlite3(file), file);
  // This build defaults WAL to NORMAL; an acknowledged job must be on disk.
  connection.driver.pragma('journal_mode = WAL');
  connection.driver.pragma('synchronous = FULL');
  connection.driver.pragma('foreign_keys = ON');
  connection.driver.pragma('cache_size = -65536');
  return connection;
}

/** Opens a further, read-only connection to a database that `openDatabase` has opened. */
export function openReader(file: string): Connection {
  const connection = open(
    () => new BetterSqlite3(file, { readonly: true, fileMustExist: true }),
    file,
  );
  connection.driver.pragma('cache_size = -65536');
  connection.driver.pragma('mmap_size = 1073741824');
  return connection;
}

function open(make: () => BetterSqlite3.Database, file: string): Connection {
  try {
    return new Connection(make());
  } catch (error) {
    throw new DatabaseRefused(
      `The database ${file} cannot be opened (${codeOf(error)}); check that the folder exists and may be written.`,
    );
  }
}

/** Looks at an existing file; when it is refused, not even an empty companion is left beside it. */
function inspect(file: string): void {
  const companions = [`${file}-shm`, `${file}-wal`].filter((name) => !existsSync(name));
  try {
    look(file);
  } catch (error) {
    for (const name of companions) rmSync(name, { force: true });
    throw error;
  }
}

/** Looks at an existing file read-only. */
function look(file: string): void {
  const connection = open(() => new BetterSqlite3(file, { readonly: true }), file);
  try {
    const tables = Number(
      connection.driver.prepare('select count(*) from sqlite_schema').pluck().get(),
    );
    if (tables === 0) return;
    if (connection.driver.pragma('application_id', { simple: true }) !== APPLICATION_ID) {
      throw new DatabaseRefused(
        `The file ${file} is a database of another program; choose another data folder.`,
      );
    }
    const version = Number(connection.driver.pragma('user_version', { simple: true }));
    if (version > migrations.length) {
      throw new DatabaseRefused(
        `The database ${file} was made by a newer Underseam (schema ${version}, this one knows ${migrations.length}); start that version instead.`,
      );
    }
    const check = connection.driver.pragma('quick_check(1)', { simple: true });
    if (check !== 'ok') throw corrupt(file);
  } catch (error) {
    if (error instanceof DatabaseRefused) throw error;
    throw corrupt(file);
  } finally {
    connection.close();
  }
}

function corrupt(file: string): DatabaseRefused {
  return new DatabaseRefused(
    `The database ${file} is damaged or not a database; nothing was changed. Restore a backup with "npm run restore".`,
  );
}

/** What goes wrong is told once, by the refusal. */
const SILENT = { warn: ignore, error: ignore, debug: ignore, deprecate: ignore };

function ignore(): void {
  // Said elsewhere.
}

async function migrate(file: string): Promise<void> {
  const knex = knexFactory({
    client: 'better-sqlite3',
    connection: { filename: file },
    useNullAsDefault: true,
    pool: { min: 1, max: 1 },
    log: SILENT,
  });
  try {
    // First of all: a start killed half-way must find its own file again, and no lock that nobody holds any more.
    await knex.raw(`pragma application_id = ${APPLICATION_ID}`);
    await knex.migrate.forceFreeMigrationsLock({ migrationSource });
    await knex.migrate.latest({ migrationSource });
    await knex.raw(`pragma user_version = ${migrations.length}`);
  } catch (error) {
    throw new DatabaseRefused(
      `The database ${file} cannot be prepared (${codeOf(error)}); check that its folder may be written and has room.`,
    );
  } finally {
    await knex.destroy();
  }
}

function codeOf(error: unknown): string {
  return error instanceof Error && 'code' in error ? String(error.code) : 'unknown reason';
}
