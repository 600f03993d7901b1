import { tellRevision } from '#shared/domain/preconditions';
import { BranchWriter } from './branch-writer';
import { sql, type Connection } from './database';
import { findLastEvent, recordAudit, type Deed } from './queries/audit';
import { listPhotos } from './queries/photos';
import { findUnderWay, listUnderWay, type UnderWayRow } from './queries/under-way';
import type { ScopedBranch } from './scope';
import type { ScopedDb } from './scoped-db';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';
import { writingReader } from './writing-reader';

/** Who keeps or drops a job under way: a person, for a push key sends finished ones only. */
export type UnderWayDeed = Deed & { actor: { personId: number } };

/** Writes the jobs under way at one branch. Bound to its branch for life; every method runs inside `WriteQueue.write`. */
export class UnderWayWriter {
  private readonly connection: Connection;
  private readonly jobs: BranchWriter;
  private readonly reader: ScopedDb;

  constructor(
    store: Store,
    readonly branch: ScopedBranch,
  ) {
    this.connection = store.writing;
    this.jobs = new BranchWriter(store, branch);
    this.reader = writingReader(store, branch);
  }

  /** A job under way as it stands at this moment. */
  find(jobRef: string): UnderWayRow | undefined {
    return findUnderWay(this.reader, this.branch.id, jobRef);
  }

  /** How many jobs are under way at the branch. */
  count(): number {
    return listUnderWay(this.reader, this.branch.id).length;
  }

  /** Who sent the job of a reference and when, in words, once it is accepted and stands. */
  acceptance(jobRef: string): string | undefined {
    const stored = this.jobs.findJob(jobRef);
    return stored && !stored.voided ? this.jobs.lastChange(jobRef) : undefined;
  }

  /** Who changed it last and when, in words, or who dropped it, or `undefined` when it was never there. */
  lastChange(jobRef: string, subject: string): string | undefined {
    const row = this.find(jobRef);
    if (row) {
      const { revision, changedBy, changedAt } = row;
      const sender = { personName: changedBy, keyLabel: null };
      return tellRevision({ revision, receivedAt: changedAt, ...sender });
    }
    const event = findLastEvent(new UnscopedDb(this.connection), 'under-way.drop', subject);
    return event && `dropped by ${event.actor} at ${event.at}`;
  }

  /** Keeps a job under way, new or as it is now. */
  keep(jobRef: string, text: string, former: UnderWayRow | undefined, deed: UnderWayDeed): void {
    const changed = {
      revision: (former?.revision ?? 0) + 1,
      content: text,
      changed_by: deed.actor.personId,
      changed_at: deed.at,
    };
    const key = { branch_id: this.branch.id, job_ref: jobRef };
    if (former) {
      this.connection.run(sql('jobs_under_way').where(key).update(changed));
    } else {
      const started = { started_by: deed.actor.personId, started_at: deed.at };
      this.connection.run(sql('jobs_under_way').insert({ ...key, ...changed, ...started }));
    }
  }

  /**
   * Drops a job under way and its photos, and says under which keys their bytes lie. Where there is a job of this reference
   * already, though void, the photos are that job's and stay.
   */
  drop(jobRef: string, former: UnderWayRow, { actor, at, subject }: UnderWayDeed): string[] {
    const key = { branch_id: this.branch.id, job_ref: jobRef };
    const place = { of: 'job', ref: jobRef } as const;
    const photos = this.jobs.findJob(jobRef) ? [] : listPhotos(this.reader, this.branch.id, place);
    if (photos.length > 0) this.connection.run(sql('photos').where(key).delete());
    this.connection.run(sql('jobs_under_way').where(key).delete());
    recordAudit(new UnscopedDb(this.connection), {
      at,
      actor,
      action: 'under-way.drop',
      subject,
      branchId: this.branch.id,
      detail: { before: JSON.parse(former.text) as unknown, photos: photos.length },
    });
    return photos.map(({ storageKey }) => storageKey);
  }
}
