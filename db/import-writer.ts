import type { ImportKind } from '#shared/contracts/imports';
import { sql } from './database';
import { recordAudit, type Actor } from './queries/audit';
import { findImport, type SentImport } from './queries/imports';
import { rowOfImport, type ImportChange, type ImportRecord } from './queries/import-row';
import type { ScopedBranch } from './scope';
import type { ScopedDb } from './scoped-db';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';
import { writingReader } from './writing-reader';

/** Who does something to a file, and when. */
export interface ImportDeed {
  actor: Actor;
  at: string;
}

/**
 * Writes of one branch's files and what their headings mean. Bound to its branch for life; every method runs inside
 * `WriteQueue.write`.
 */
export class ImportWriter {
  private readonly db: UnscopedDb;
  private readonly reader: ScopedDb;

  constructor(
    store: Pick<Store, 'writing'>,
    readonly branch: ScopedBranch,
  ) {
    this.db = new UnscopedDb(store.writing);
    this.reader = writingReader(store, branch);
  }

  find(id: string): SentImport | undefined {
    return findImport(this.reader, this.branch.code, id);
  }

  add(record: Omit<ImportRecord, 'branchId'>): void {
    this.db.run(sql('imports').insert({ ...rowOfImport(record), branch_id: this.branch.id }));
  }

  change(id: string, change: ImportChange): void {
    this.db.run(
      sql('imports').where({ id, branch_id: this.branch.id }).update(rowOfImport(change)),
    );
  }

  /** Remembers what a heading means to the branch; `null`: it is left out. */
  remember(kind: ImportKind, headingKey: string, field: string | null): void {
    this.db
      .prepare(
        `insert into import_columns (branch_id, kind, heading_key, field) values (?, ?, ?, ?)
          on conflict (branch_id, kind, heading_key) do update set field = excluded.field`,
      )
      .run(this.branch.id, kind, headingKey, field);
  }

  /** Tells the trail what was done to a file. */
  tell(
    action: string,
    id: string,
    { actor, at }: ImportDeed,
    detail: Record<string, unknown>,
  ): void {
    recordAudit(this.db, {
      at,
      actor,
      action,
      subject: `/branches/${this.branch.code}/imports/${id}`,
      branchId: this.branch.id,
      detail,
    });
  }
}

/** Files that were being read or written when the server went down end as `stopped`; what was written stays, and is counted. */
export function stopInterruptedImports({ writing }: Pick<Store, 'writing'>, at: string): number {
  return new UnscopedDb(writing).run(
    sql('imports')
      .whereIn('state', ['checking', 'writing'])
      .update({ state: 'stopped', ended_at: at }),
  ).changes;
}

/** Ids of the files of all branches that ended after a moment, or have not ended: those whose bytes are still kept. */
export function importsToKeep({ writing }: Pick<Store, 'writing'>, endedAfter: string): string[] {
  return new UnscopedDb(writing)
    .all<{ id: string }>(
      sql('imports')
        .where('received_at', '>', endedAfter)
        .orWhere('ended_at', '>', endedAfter)
        .select('id'),
    )
    .map(({ id }) => id);
}
