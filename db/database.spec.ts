import { createHash } from 'node:crypto';
import BetterSqlite3 from 'better-sqlite3';
import knexFactory from 'knex';
import {
  copyFileSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  truncateSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { APPLICATION_ID, DatabaseRefused, openDatabase } from './database';
import { migrations } from './migrations';
import { Store } from './store';

let folder: string;
let file: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'database-'));
  file = join(folder, 'underseam.sqlite');
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const pragma = (name: string): unknown => {
  const driver = new BetterSqlite3(file, { readonly: true });
  try {
    return driver.pragma(name, { simple: true });
  } finally {
    driver.close();
  }
};
const tables = (): unknown[] => {
  const driver = new BetterSqlite3(file, { readonly: true });
  try {
    return driver.prepare("select name from sqlite_schema where type = 'table'").pluck().all();
  } finally {
    driver.close();
  }
};
const contents = (): string[] =>
  readdirSync(folder).map(
    (name) =>
      `${name} ${createHash('sha256')
        .update(readFileSync(join(folder, name)))
        .digest('hex')}`,
  );

/** Opens, expecting a refusal in one sentence and every file of the folder as it was, byte for byte. */
async function expectRefused(pattern: RegExp): Promise<void> {
  const before = contents();
  const error: unknown = await Store.open(folder).then(
    (store) => store.close(),
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(DatabaseRefused);
  expect((error as Error).message).toMatch(pattern);
  expect((error as Error).message).not.toContain('\n');
  expect(contents()).toEqual(before);
}
async function makeSound(): Promise<void> {
  const store = await Store.open(folder);
  store.close();
}

describe('openDatabase', () => {
  it('given no file, makes one that is marked, current and durable', async () => {
    const connection = await openDatabase(file);
    expect(connection.driver.pragma('journal_mode', { simple: true })).toBe('wal');
    expect(connection.driver.pragma('synchronous', { simple: true })).toBe(2);
    expect(connection.driver.pragma('foreign_keys', { simple: true })).toBe(1);
    connection.close();
    expect(pragma('application_id')).toBe(APPLICATION_ID);
    expect(pragma('user_version')).toBe(migrations.length);
  });

  it('given an empty file, fills it', async () => {
    writeFileSync(file, '');
    await makeSound();
    expect(tables()).toContain('jobs');
  });

  it('given a file of an older version, brings it up to date and keeps its rows', async () => {
    const knex = knexFactory({
      client: 'better-sqlite3',
      connection: { filename: file },
      useNullAsDefault: true,
    });
    const first = migrations.slice(0, 1);
    await knex.migrate.latest({
      migrationSource: {
        getMigrations: async () => [...first],
        getMigrationName: (migration: (typeof migrations)[number]) => migration.name,
        getMigration: async (migration: (typeof migrations)[number]) => migration,
      },
    });
    await knex.raw(`pragma application_id = ${APPLICATION_ID}`);
    await knex.raw('pragma user_version = 1');
    await knex('regions').insert({ code: 'COAST', name: 'Coast' });
    await knex.destroy();
    expect(tables()).not.toContain('jobs');
    const store = await Store.open(folder);
    expect(store.unscoped.prepare('select name from regions').all()).toEqual([{ name: 'Coast' }]);
    store.close();
    expect(tables()).toContain('jobs');
    expect(pragma('user_version')).toBe(migrations.length);
  });

  it('given a file that a start left half prepared, prepares it', async () => {
    await makeSound();
    const driver = new BetterSqlite3(file);
    driver.exec('update knex_migrations_lock set is_locked = 1');
    driver.pragma('user_version = 0');
    driver.close();
    await makeSound();
    expect(pragma('user_version')).toBe(migrations.length);
  });

  it('given a stop before the first migration, has marked the file as its own already', async () => {
    const [first] = migrations;
    const up = jest.spyOn(first!, 'up').mockImplementation(async (knex) => {
      await knex.raw('create table begun (n integer)');
      throw new Error('killed');
    });
    await expect(openDatabase(file)).rejects.toBeInstanceOf(DatabaseRefused);
    up.mockRestore();
    await makeSound();
    expect(tables()).toContain('jobs');
  });
});

describe('openDatabase of a file that is not for it', () => {
  it('given a newer version, refuses and touches nothing', async () => {
    await makeSound();
    const driver = new BetterSqlite3(file);
    driver.pragma('journal_mode = delete');
    driver.pragma(`user_version = ${migrations.length + 1}`);
    driver.close();
    await expectRefused(/newer/);
  });

  it('given a database of another program, refuses and touches nothing', async () => {
    const driver = new BetterSqlite3(file);
    driver.exec('create table notes (text)');
    driver.close();
    await expectRefused(/another program/);
  });

  it('given text, refuses and touches nothing', async () => {
    writeFileSync(file, 'this is a letter, not a database\n'.repeat(500));
    await expectRefused(/damaged|not a database/);
  });

  it('given pages that were overwritten, refuses and touches nothing', async () => {
    await makeSound();
    const bytes = readFileSync(file);
    bytes.fill(0xa5, 4096 * 3, 4096 * 6);
    writeFileSync(file, bytes);
    await expectRefused(/damaged/);
  });

  it('given a file cut short, refuses and touches nothing', async () => {
    await makeSound();
    truncateSync(file, Math.floor(readFileSync(file).length / 2));
    await expectRefused(/damaged/);
  });

  it('given a header that lies about the rest, refuses and touches nothing', async () => {
    await makeSound();
    const bytes = readFileSync(file);
    bytes.fill(0, 100);
    writeFileSync(file, bytes);
    await expectRefused(/damaged|another program/);
  });

  it('given a folder where the file should be, refuses', async () => {
    mkdirSync(file);
    const opened = Store.open(folder);
    await expect(opened).rejects.toBeInstanceOf(DatabaseRefused);
  });

  it('given a data folder that cannot be made, refuses in one sentence', async () => {
    const letter = join(folder, 'letter');
    writeFileSync(letter, 'x');
    for (const place of [letter, join(letter, 'data')]) {
      await expect(Store.open(place)).rejects.toThrow(/cannot be made or written/);
    }
    expect(readFileSync(letter, 'utf8')).toBe('x');
  });
});

describe('Store.open after a kill', () => {
  it('given commits that lie in the log beside the file, has them', async () => {
    const store = await Store.open(folder);
    await store.queue.write(() =>
      store.unscoped.prepare("insert into regions (code, name) values ('COAST', 'Coast')").run(),
    );
    const copy = mkdtempSync(join(tmpdir(), 'database-'));
    // What a kill leaves: the file and its log, not folded together.
    for (const name of ['underseam.sqlite', 'underseam.sqlite-wal']) {
      expect(existsSync(join(folder, name))).toBe(true);
      copyFileSync(join(folder, name), join(copy, name));
    }
    store.close();
    const again = await Store.open(copy);
    expect(again.unscoped.prepare('select code from regions').all()).toEqual([{ code: 'COAST' }]);
    again.close();
    rmSync(copy, { recursive: true });
  });
});
