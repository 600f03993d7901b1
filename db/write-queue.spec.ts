import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { Connection } from './database';
import { WriteQueue } from './write-queue';

let folder: string;
let connection: Connection;
let other: BetterSqlite3.Database;
let queue: WriteQueue;
let lost: number;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'queue-'));
  const file = join(folder, 'queue.sqlite');
  connection = new Connection(new BetterSqlite3(file));
  connection.driver.pragma('journal_mode = WAL');
  connection.driver.pragma('foreign_keys = ON');
  connection.driver.exec('create table parent (id integer primary key)');
  connection.driver.exec(
    `create table kept (n integer primary key,
      parent integer references parent (id) deferrable initially deferred)`,
  );
  other = new BetterSqlite3(file, { readonly: true });
  lost = 0;
  queue = new WriteQueue(connection, () => (lost += 1));
});
afterEach(() => {
  other.close();
  connection.close();
  rmSync(folder, { recursive: true });
});

const insert =
  (n: number, parent: number | null = null) =>
  () =>
    connection.prepare('insert into kept values (?, ?)').run(n, parent);
const committed = (): unknown[] => other.prepare('select n from kept order by n').pluck().all();

describe('WriteQueue', () => {
  it('given work that waits in the same turn, commits it together and in order', async () => {
    const begun: number[] = [];
    const works = [1, 2, 3].map((n) =>
      queue.write(() => {
        begun.push(n);
        insert(n)();
        // Nobody else sees any of it before the one commit.
        expect(committed()).toEqual([]);
        return n * 10;
      }),
    );
    expect(await Promise.all(works)).toEqual([10, 20, 30]);
    expect(begun).toEqual([1, 2, 3]);
    expect(committed()).toEqual([1, 2, 3]);
  });

  it('given a promise that settles, has the work on disk for every other connection', async () => {
    await queue.write(insert(7));
    expect(committed()).toEqual([7]);
  });

  it('given one piece that throws, takes nothing of it and everything of the others', async () => {
    const settled = await Promise.allSettled([
      queue.write(insert(1)),
      queue.write(() => {
        insert(2)();
        throw new Error('a bad piece');
      }),
      queue.write(insert(1)),
      queue.write(insert(3)),
    ]);
    expect(settled.map(({ status }) => status)).toEqual([
      'fulfilled',
      'rejected',
      'rejected',
      'fulfilled',
    ]);
    expect(committed()).toEqual([1, 3]);
    expect(lost).toBe(0);
  });

  it('given a commit that fails, keeps nothing, tells everybody and works on', async () => {
    const settled = await Promise.allSettled([queue.write(insert(1)), queue.write(insert(2, 99))]);
    expect(settled.map(({ status }) => status)).toEqual(['rejected', 'rejected']);
    expect(committed()).toEqual([]);
    expect(lost).toBe(1);
    await queue.write(insert(3));
    expect(committed()).toEqual([3]);
  });

  it('given a full disk, keeps nothing of the batch, tells everybody and works on when there is room', async () => {
    const pages = Number(connection.driver.pragma('page_count', { simple: true }));
    connection.driver.exec('create table big (text)');
    connection.driver.pragma(`max_page_count = ${pages + 3}`);
    const fill = () => connection.prepare('insert into big values (?)').run('x'.repeat(100_000));
    const settled = await Promise.allSettled([queue.write(insert(1)), queue.write(fill)]);
    expect(settled[1].status).toBe('rejected');
    // Whatever was told is what is there.
    expect(committed()).toEqual(settled[0].status === 'fulfilled' ? [1] : []);
    connection.driver.pragma('max_page_count = 100000');
    await Promise.all([queue.write(insert(5)), queue.write(fill)]);
    expect(committed()).toContain(5);
  });

  it('given work sent from inside a piece, takes it into a later commit', async () => {
    const inner: Promise<unknown>[] = [];
    await queue.write(() => {
      insert(1)();
      inner.push(queue.write(insert(2)));
    });
    expect(committed()).toEqual([1]);
    await Promise.all(inner);
    expect(committed()).toEqual([1, 2]);
  });

  it('given close, commits what waits and takes no more', async () => {
    const waiting = queue.write(insert(1));
    queue.close();
    await waiting;
    expect(committed()).toEqual([1]);
    await expect(queue.write(insert(2))).rejects.toThrow('closing');
  });
});
