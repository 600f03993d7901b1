import type { Connection } from './database';

/** What of a branch changed in one commit. */
export interface BranchChange {
  readonly kind: 'jobs' | 'claims';
  readonly branchId: number;
  /** How many were written. */
  readonly count: number;
  /** How many of those were not there before. */
  readonly added: number;
  /** The person who did it; absent: a branch's own system, or the product itself. */
  readonly by?: number;
}

type Listener = (changes: readonly BranchChange[]) => void;

/** What SQL notes with. */
const NOTE = 'note_branch_change';

/** Rows whose change is told of; others hang on them or are derived from them. */
const WATCHED = [
  { table: 'jobs', columns: ['revision', 'voided_at'] },
  { table: 'claims', columns: ['revision'] },
] as const;

/**
 * Notes which branches' jobs and claims the writing connection changes, by triggers that live on that connection alone, so
 * that no way of writing goes round it. What a piece of work noted is taken back with the piece, and nothing is told before
 * its commit.
 */
export class NotedChanges {
  private noted: BranchChange[] = [];
  private by: number | undefined;
  private readonly listeners: Listener[] = [];

  constructor(connection: Connection) {
    connection.driver.function(NOTE, (kind: unknown, branchId: unknown, added: unknown) => {
      this.noted.push({
        kind: kind as BranchChange['kind'],
        branchId: Number(branchId),
        count: 1,
        added: Number(added),
        by: this.by,
      });
      return null;
    });
    for (const { table, columns } of WATCHED) {
      connection.driver.exec(
        `create temp trigger note_added_${table} after insert on main.${table} begin
          select ${NOTE}('${table}', new.branch_id, 1); end;
        create temp trigger note_changed_${table} after update of ${columns.join(', ')} on main.${table} begin
          select ${NOTE}('${table}', new.branch_id, 0); end`,
      );
    }
  }

  /** Tells `listener` of every commit from now on that changed something. */
  listen(listener: Listener): void {
    this.listeners.push(listener);
  }

  /** Where the notes stand, to take back what comes after; that is `by`'s doing. */
  mark(by?: number): number {
    this.by = by;
    return this.noted.length;
  }

  /** Forgets what was noted since a mark: it was rolled back. */
  takeBack(mark: number): void {
    this.noted.length = mark;
  }

  /** Tells what was noted, one change a kind, branch and person: it is committed. */
  tell(): void {
    const changes = joined(this.noted);
    this.noted = [];
    if (changes.length === 0) return;
    for (const listener of this.listeners) listener(changes);
  }
}

function joined(noted: readonly BranchChange[]): BranchChange[] {
  const changes = new Map<string, BranchChange>();
  for (const change of noted) {
    const key = `${change.kind} ${change.branchId} ${change.by}`;
    const before = changes.get(key) ?? { ...change, count: 0, added: 0 };
    changes.set(key, {
      ...before,
      count: before.count + change.count,
      added: before.added + change.added,
    });
  }
  return [...changes.values()];
}
