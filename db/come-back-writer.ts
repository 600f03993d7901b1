import type { ComeBackStatus } from '#shared/domain/vocabulary';
import type { Connection } from './database';
import { recordAudit, type Actor } from './queries/audit';
import { findLeft } from './queries/come-back-of-job';
import type { ComeBackRow } from './queries/come-back-row';
import type { ScopedBranch } from './scope';
import type { ScopedDb } from './scoped-db';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';
import { writingReader } from './writing-reader';

/** What a person says of a finding left on a car. */
export interface Mark {
  status: ComeBackStatus;
  dueOn: string | null;
  note: string;
  ownerToldOn: string | null;
}

/** What a mark is set on: a finding, and how many marks it has already. */
export type MarkedFinding = Pick<ComeBackRow, 'job_id' | 'job_ref' | 'ref' | 'revision'>;

/** Who sets a mark and when. */
export interface Marking {
  actor: Actor & { personId: number };
  at: string;
}

/**
 * Writes the marks on what one branch left on cars. Bound to its branch for life; every method runs inside
 * `WriteQueue.write`.
 */
export class ComeBackWriter {
  private readonly connection: Connection;
  private readonly reader: ScopedDb;

  constructor(
    store: Store,
    readonly branch: ScopedBranch,
  ) {
    this.connection = store.writing;
    this.reader = writingReader(store, branch);
  }

  /** A finding left on a car as it stands at this moment. */
  find(jobRef: string, ref: string): ComeBackRow | undefined {
    return findLeft(this.reader, this.branch.code, jobRef, ref);
  }

  /** Adds a mark to those of a finding and tells the trail; `before` is the one that held until now. */
  mark(found: MarkedFinding, mark: Mark, before: Mark | null, { actor, at }: Marking): void {
    this.connection
      .prepare(
        `insert into come_back_marks (branch_id, job_id, ref, revision, status, due_on, note,
          owner_told_on, person_id, changed_at) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      )
      .run(
        this.branch.id,
        found.job_id,
        found.ref,
        (found.revision ?? 0) + 1,
        mark.status,
        mark.dueOn,
        mark.note,
        mark.ownerToldOn,
        actor.personId,
        at,
      );
    recordAudit(new UnscopedDb(this.connection), {
      at,
      actor,
      action: 'come-back.mark',
      subject: `/branches/${this.branch.code}/come-back/${found.job_ref}/${found.ref}`,
      branchId: this.branch.id,
      detail: { before, after: mark },
    });
  }
}
