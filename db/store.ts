import { accessSync, constants, existsSync, mkdirSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { DatabaseRefused, openDatabase, openReader, type Connection } from './database';
import { NetworkState } from './network-state';
import { NetworkReference } from './network-reference';
import { NotedChanges } from './noted-changes';
import { recoverGenerations, Restatement } from './restatement';
import type { Scope } from './scope';
import { ScopedDb } from './scoped-db';
import { UnscopedDb } from './unscoped-db';
import { WriteQueue } from './write-queue';

/** The data folder opened: one writing connection behind its queue, one reading connection, and what is kept in memory. */
export class Store {
  readonly queue: WriteQueue;
  readonly state: NetworkState;
  /** Which branches' jobs and claims each commit changed. */
  readonly changes: NotedChanges;
  /** For network-wide rows; writes with it only inside `queue.write`. */
  readonly unscoped: UnscopedDb;
  readonly restatement: Restatement;

  private constructor(
    readonly file: string,
    /** Only for `BranchWriter` and its like in `db/`. */
    readonly writing: Connection,
    private readonly reading: Connection,
  ) {
    this.state = new NetworkState(writing);
    this.changes = new NotedChanges(writing);
    this.queue = new WriteQueue(writing, () => this.state.reload(), this.changes);
    this.unscoped = new UnscopedDb(writing);
    this.restatement = new Restatement(this);
  }

  /** Opens (and on first use makes) the data folder's database. Throws `DatabaseRefused` with one clear sentence. */
  static async open(folder: string): Promise<Store> {
    try {
      // Asked first, because making a folder below one that refuses can hang instead of failing.
      accessSync(nearestFolder(folder), constants.W_OK);
      mkdirSync(folder, { recursive: true });
    } catch {
      throw new DatabaseRefused(
        `The data folder ${folder} cannot be made or written; set UNDERSEAM_DATA to a folder that can.`,
      );
    }
    const file = join(folder, 'underseam.sqlite');
    const writing = await openDatabase(file);
    writing.driver.transaction(() => recoverGenerations(writing))();
    return new Store(file, writing, openReader(file));
  }

  /** A reader bound to a scope. */
  scoped(scope: Scope): ScopedDb {
    return new ScopedDb(this.reading, scope);
  }

  /** What a caller of a scope may know of the network beyond it. */
  reference(scope: Scope): NetworkReference {
    return new NetworkReference(this.reading, scope);
  }

  /** Folds the write-ahead log into the file and lets the planner learn the tables, after very many rows at once. */
  tidy(): void {
    this.writing.driver.pragma('wal_checkpoint(TRUNCATE)');
    this.writing.driver.pragma('optimize');
  }

  close(): void {
    this.queue.close();
    this.reading.close();
    this.writing.driver.pragma('optimize');
    this.writing.close();
  }
}

/** The folder itself, or the nearest one above it that exists. */
function nearestFolder(folder: string): string {
  let at = resolve(folder);
  while (!existsSync(at) && dirname(at) !== at) at = dirname(at);
  return at;
}
