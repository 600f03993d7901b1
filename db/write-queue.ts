import type { Connection } from './database';
import type { NotedChanges } from './noted-changes';

interface Waiting {
  work: () => unknown;
  by: number | undefined;
  resolve: (value: unknown) => void;
  reject: (error: unknown) => void;
}

/**
 * The one way to write. Work that waits in the same turn of the event loop shares one transaction and one durable commit;
 * each piece has a savepoint of its own, so that one that throws takes nothing of the others with it. A promise settles
 * after the commit: what was acknowledged is on disk.
 */
export class WriteQueue {
  private waiting: Waiting[] = [];
  private scheduled = false;
  private closed = false;

  constructor(
    private readonly connection: Connection,
    /** Called when a commit failed, so that what is kept in memory is read again. */
    private readonly onLost: () => void = () => undefined,
    /** What the work notes as it writes; told once it is durable, taken back where it is not kept. */
    private readonly changes: Pick<NotedChanges, 'mark' | 'takeBack' | 'tell'> = NOTHING_NOTED,
  ) {}

  /**
   * Runs `work` (synchronous, on the writing connection) in the next commit and returns its value once that is durable. `by` is
   * the person who does it, so that they are not told of it as news.
   */
  write<T>(work: () => T, by?: number | null): Promise<T> {
    if (this.closed) return Promise.reject(new Error('the database is closing'));
    return new Promise<T>((resolve, reject) => {
      const told = resolve as (value: unknown) => void;
      this.waiting.push({ work, by: by ?? undefined, resolve: told, reject });
      if (this.scheduled) return;
      this.scheduled = true;
      // One more turn, so that requests whose bodies arrive meanwhile share this commit: it costs far more than the wait.
      setImmediate(() => setImmediate(() => this.commitWaiting()));
    });
  }

  /** Commits what waits and takes no more. */
  close(): void {
    this.commitWaiting();
    this.closed = true;
  }

  private commitWaiting(): void {
    const batch = this.waiting;
    this.waiting = [];
    this.scheduled = false;
    if (batch.length === 0) return;
    const settle: (() => void)[] = [];
    const before = this.changes.mark();
    try {
      this.connection.prepare('begin immediate').run();
      for (const { work, by, resolve, reject } of batch) {
        this.connection.prepare('savepoint piece').run();
        const mark = this.changes.mark(by);
        try {
          const value = work();
          this.connection.prepare('release piece').run();
          settle.push(() => resolve(value));
        } catch (error) {
          this.connection.prepare('rollback to piece').run();
          this.connection.prepare('release piece').run();
          this.changes.takeBack(mark);
          settle.push(() => reject(error));
        }
      }
      this.connection.prepare('commit').run();
    } catch (error) {
      // A full disk or a lost file: nothing of the batch is kept, and everybody who waits is told.
      if (this.connection.driver.inTransaction) this.connection.prepare('rollback').run();
      this.changes.takeBack(before);
      this.onLost();
      for (const { reject } of batch) reject(error);
      return;
    }
    for (const tell of settle) tell();
    this.changes.tell();
  }
}

const NOTHING_NOTED = { mark: () => 0, takeBack: () => undefined, tell: () => undefined };
