import { spawn, type ChildProcess } from 'node:child_process';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { openDatabase } from '#db/database';
import { recordAudit } from '#db/queries/audit';
import { UnscopedDb } from '#db/unscoped-db';
import { restoreBackup } from './restore-backup';
import { takeBackup } from './take-backup';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

const NOW = new Date('2026-02-01T07:00:00Z');
let folder = '';
let database = '';
let copy = '';

beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'backup-'));
  database = path.join(folder, 'underseam.sqlite');
  copy = path.join(folder, 'copies', 'monday.sqlite');
  const connection = await openDatabase(database);
  const db = new UnscopedDb(connection);
  for (const code of ['N1', 'N2', 'N3']) {
    recordAudit(db, {
      at: NOW.toISOString(),
      actor: { label: 'system', personId: null, pushKeyId: null, address: 'local' },
      action: 'region.set',
      subject: `regions/${code}`,
      branchId: null,
      detail: {},
    });
  }
  connection.close();
});
afterEach(() => rmSync(folder, { recursive: true }));

/** Runs a statement or reads a value on a file of its own accord. */
function on<T>(file: string, work: (driver: BetterSqlite3.Database) => T): T {
  const driver = new BetterSqlite3(file);
  try {
    return work(driver);
  } finally {
    driver.close();
  }
}

const count = (file: string, table: string): number =>
  on(file, (driver) => Number(driver.prepare(`select count(*) from ${table}`).pluck().get()));

/** Starts a process that commits pairs of rows, one in each of two tables, as fast as it can. */
function startWriting(): ChildProcess {
  const program = `
    const driver = new (require('better-sqlite3'))(${JSON.stringify(database)});
    driver.pragma('synchronous = FULL');
    const region = driver.prepare('insert into regions (code, name) values (?, ?)');
    const product = driver.prepare("insert into products (code, name, kind) values (?, ?, 'cavity_wax')");
    const pair = driver.transaction((code) => { region.run(code, code); product.run(code, code); });
    let n = 0;
    const more = () => { for (let i = 0; i < 20; i += 1) pair('C' + (n += 1)); if (n === 200) console.log('ready'); setImmediate(more); };
    more();`;
  return spawn(process.execPath, ['-e', program], { stdio: ['ignore', 'pipe', 'inherit'] });
}

describe('takeBackup', () => {
  it('given rows written all the while, copies one instant of them, whole', async () => {
    const writer = startWriting();
    await new Promise((resolve) => writer.stdout?.once('data', resolve));
    const before = count(database, 'regions');
    const contents = await takeBackup(database, copy);
    const after = count(database, 'regions');
    writer.kill();
    await new Promise((resolve) => writer.once('close', resolve));
    const copied = count(copy, 'regions');
    expect(copied).toBeGreaterThanOrEqual(before);
    expect(copied).toBeLessThanOrEqual(after);
    expect(count(copy, 'products')).toBe(copied);
    expect(count(database, 'regions')).toBeGreaterThan(copied);
    expect(contents).toMatchObject({ jobs: 0, auditEvents: 3 });
    expect(readdirSync(path.dirname(copy))).toEqual(['monday.sqlite']);
    expect(statSync(copy).mode & 0o777).toBe(0o600);
  });

  it('given a file of that name already, leaves it alone', async () => {
    await takeBackup(database, copy);
    const was = readFileSync(copy);
    await expect(takeBackup(database, copy)).rejects.toThrow(/already a file/);
    expect(readFileSync(copy).equals(was)).toBe(true);
  });

  it('given no database, says so and leaves nothing', async () => {
    await expect(takeBackup(path.join(folder, 'none.sqlite'), copy)).rejects.toThrow(
      /There is no database/,
    );
    expect(readdirSync(path.dirname(copy))).toEqual([]);
  });

  it('given an audit trail that somebody changed, refuses the copy and leaves nothing', async () => {
    on(database, (driver) => {
      driver.exec('drop trigger audit_events_no_update');
      driver.exec(`update audit_events set actor = 'nobody' where id = 2`);
    });
    await expect(takeBackup(database, copy)).rejects.toThrow(/event 2/);
    expect(readdirSync(path.dirname(copy))).toEqual([]);
  });
});

describe('restoreBackup', () => {
  const addRegion = (file: string): void =>
    on(file, (driver) => {
      driver.exec(`insert into regions (code, name) values ('LATE', 'Late')`);
    });

  it('given an empty folder, puts the backup there and writes so into its audit trail', async () => {
    await takeBackup(database, copy);
    const target = path.join(folder, 'new', 'underseam.sqlite');
    const restored = await restoreBackup(copy, target, 'refuse', NOW);
    expect(restored).toMatchObject({ auditEvents: 4, keptIn: undefined });
    expect(readdirSync(path.dirname(target))).toEqual(['underseam.sqlite']);
    const last = on(target, (driver) =>
      driver.prepare('select action, detail from audit_events order by id desc').get(),
    );
    expect(last).toEqual({ action: 'database.restore', detail: '{"backup":"monday.sqlite"}' });
    (await openDatabase(target)).close();
  });

  it('given a database that stands there, refuses and changes nothing', async () => {
    await takeBackup(database, copy);
    addRegion(database);
    await expect(restoreBackup(copy, database, 'refuse', NOW)).rejects.toThrow(/--move-aside/);
    expect(count(database, 'regions')).toBe(1);
    expect(readdirSync(folder).sort()).toEqual(['copies', 'underseam.sqlite']);
  });

  it('given leave to move it aside, keeps the former one whole', async () => {
    await takeBackup(database, copy);
    addRegion(database);
    const { keptIn } = await restoreBackup(copy, database, 'move-aside', NOW);
    expect(count(database, 'regions')).toBe(0);
    expect(keptIn).toBe(path.join(folder, 'before-restore-20260201T070000Z'));
    expect(count(path.join(keptIn ?? '', 'underseam.sqlite'), 'regions')).toBe(1);
  });

  it('given a server that has the database open, refuses even with leave', async () => {
    await takeBackup(database, copy);
    const server = await openDatabase(database);
    try {
      server.driver.prepare('select count(*) from regions').get();
      await expect(restoreBackup(copy, database, 'move-aside', NOW)).rejects.toThrow(/in use/);
      server.driver.exec(`insert into regions (code, name) values ('NEXT', 'Next')`);
    } finally {
      server.close();
    }
    expect(count(database, 'regions')).toBe(1);
  });

  it('given a damaged database, puts the backup in its place and keeps it', async () => {
    await takeBackup(database, copy);
    writeFileSync(database, 'not a database at all, but long enough to be looked at');
    writeFileSync(`${database}-wal`, 'left behind');
    const { keptIn } = await restoreBackup(copy, database, 'move-aside', NOW);
    expect(count(database, 'audit_events')).toBe(4);
    const kept = (name: string): string => readFileSync(path.join(keptIn ?? '', name), 'utf8');
    expect(kept('underseam.sqlite')).toContain('not a database at all');
    expect(kept('underseam.sqlite-wal')).toBe('left behind');
    expect(existsSync(`${database}-wal`)).toBe(false);
  });

  it.each<[what: string, spoil: () => void, sentence: RegExp]>([
    [
      'that is cut short',
      () => writeFileSync(copy, readFileSync(copy).subarray(0, 9000)),
      /damaged/,
    ],
    ['that is no database', () => writeFileSync(copy, 'a letter to the branch'), /damaged/],
    [
      'of another program',
      () => on(copy, (driver) => void driver.pragma('application_id = 7')),
      /not an Underseam/,
    ],
    [
      'of a newer version',
      () => on(copy, (driver) => void driver.pragma('user_version = 9999')),
      /newer/,
    ],
    ['that is not there', () => rmSync(copy), /There is no file/],
  ])(
    'given a backup %s, refuses it before touching the database',
    async (_what, spoil, sentence) => {
      await takeBackup(database, copy);
      spoil();
      const was = readFileSync(database);
      await expect(restoreBackup(copy, database, 'move-aside', NOW)).rejects.toThrow(sentence);
      expect(readFileSync(database).equals(was)).toBe(true);
      expect(readdirSync(folder).filter((name) => name.includes('restore'))).toEqual([]);
    },
  );
});

describe('Photos', () => {
  const bytesAt = (place: string): string => readFileSync(path.join(place, 'AAA/one.jpg'), 'utf8');
  const keep = (place: string, name: string, bytes: string): void => {
    mkdirSync(path.join(place, 'AAA'), { recursive: true });
    writeFileSync(path.join(place, 'AAA', name), bytes);
  };
  /** A row for each, as if a job of theirs were there. */
  const record = (...keys: string[]): void =>
    on(database, (driver) => {
      driver.exec(`insert into regions (id, code, name) values (1, 'R', 'R')`);
      driver.exec(
        `insert into branches (id, code, name, region_id, time_zone, opened_on)
          values (1, 'AAA', 'A', 1, 'Europe/Berlin', '2020-01-01')`,
      );
      for (const key of keys) {
        driver
          .prepare(
            `insert into photos (branch_id, job_ref, photo_ref, storage_key, sent_hash, width, height,
              bytes, received_at) values (1, 'j', ?, ?, '', 1, 1, 3, '')`,
          )
          .run(key, key);
      }
    });
  /** The same, as if it were of a claim. */
  const recordOfClaim = (key: string): void =>
    on(database, (driver) => {
      driver
        .prepare(
          `insert into claim_photos (branch_id, claim_ref, photo_ref, storage_key, sent_hash, width,
            height, bytes, received_at) values (1, 'c', ?, ?, '', 1, 1, 3, '')`,
        )
        .run(key, key);
    });
  let photos = '';
  beforeEach(() => (photos = path.join(folder, 'photos')));

  it('given some in the data folder, are copied beside the backup and back, and none that is there is touched', async () => {
    record('AAA/one');
    keep(photos, 'one.jpg', 'one');
    keep(photos, 'one-small.jpg', 'small');
    keep(photos, 'half.jpg.unfinished', 'ha');
    const taken = await takeBackup(database, copy);
    expect(taken).toMatchObject({ photoKeys: ['AAA/one'], photosIn: `${copy}.photos`, missing: 0 });
    expect(readdirSync(path.dirname(copy)).sort()).toEqual([
      'monday.sqlite',
      'monday.sqlite.photos',
    ]);
    expect(readdirSync(path.join(`${copy}.photos`, 'AAA')).sort()).toEqual([
      'one-small.jpg',
      'one.jpg',
    ]);
    rmSync(photos, { recursive: true });
    keep(photos, 'later.jpg', 'later');
    const restored = await restoreBackup(copy, database, 'move-aside', NOW);
    expect(restored.missing).toBe(0);
    expect(bytesAt(photos)).toBe('one');
    expect(readdirSync(path.join(photos, 'AAA')).sort()).toEqual([
      'later.jpg',
      'one-small.jpg',
      'one.jpg',
    ]);
  });

  it('given one that is nowhere, are told short of it', async () => {
    record('AAA/one', 'AAA/lost');
    keep(photos, 'one.jpg', 'one');
    recordOfClaim('AAA/claimed');
    expect((await takeBackup(database, copy)).missing).toBe(2);
    rmSync(`${copy}.photos`, { recursive: true });
    rmSync(photos, { recursive: true });
    expect((await restoreBackup(copy, database, 'move-aside', NOW)).missing).toBe(3);
  });

  it('given a folder of that name already, leave it alone', async () => {
    mkdirSync(`${copy}.photos`, { recursive: true });
    await expect(takeBackup(database, copy)).rejects.toThrow(/already a folder/);
    expect(existsSync(copy)).toBe(false);
  });

  it('given a copy that does not hold, leave nothing behind', async () => {
    keep(photos, 'one.jpg', 'one');
    on(database, (driver) => {
      driver.exec('drop trigger audit_events_no_update');
      driver.exec(`update audit_events set actor = 'nobody' where id = 2`);
    });
    await expect(takeBackup(database, copy)).rejects.toThrow(/event 2/);
    expect(readdirSync(path.dirname(copy))).toEqual([]);
  });
});
