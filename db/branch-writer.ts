import type { Moneyed } from '#shared/domain/keep-stored-money';
import { tellRevision, type SentRevision } from '#shared/domain/preconditions';
import type { RecordedJob } from '#shared/domain/recorded-job';
import type { Source } from '#shared/domain/vocabulary';
import type { Connection } from './database';
import { insertReceived, removeDerived } from './derived-rows';
import { contentUnderWay, endUnderWay } from './job-under-way';
import type { NetworkState } from './network-state';
import { findLastEvent, recordAudit, type Actor } from './queries/audit';
import type { JobIdentity } from './queries/fact-row';
import type { ScopedBranch } from './scope';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';

/** A job as it stands: its newest revision, voided or not. */
export interface StoredJob {
  id: number;
  revision: number;
  warrantyMonths: number;
  voided: boolean;
  content: RecordedJob;
  /** The content as kept: what "the same" is judged by. */
  text: string;
}

/** Who sent a revision, when and by which way. */
export interface Receipt {
  actor: Actor;
  source: Source;
  receivedAt: string;
}

export type JobChange = 'created' | 'replaced' | 'restored';

interface JobRow {
  id: number;
  revision: number;
  warranty_months: number;
  voided_at: string | null;
  content: string;
}

const FIND = `select jobs.id, jobs.revision, warranty_months, voided_at, content from jobs
  join job_revisions on job_revisions.job_id = jobs.id and job_revisions.revision = jobs.revision
  where branch_id = ? and job_ref = ?`;

/**
 * Writes of one branch's jobs. Bound to its branch for life, so that no write can land in another; every method runs inside
 * `WriteQueue.write`.
 */
export class BranchWriter {
  private readonly connection: Connection;
  readonly state: NetworkState;

  constructor(
    store: Pick<Store, 'writing' | 'state'>,
    readonly branch: ScopedBranch,
  ) {
    this.connection = store.writing;
    this.state = store.state;
  }

  /** The job of a reference, voided or not, or `undefined`. */
  findJob(jobRef: string): StoredJob | undefined {
    const row = this.connection.prepare(FIND).get(this.branch.id, jobRef) as JobRow | undefined;
    return (
      row && {
        id: row.id,
        revision: row.revision,
        warrantyMonths: row.warranty_months,
        voided: row.voided_at !== null,
        content: JSON.parse(row.content) as RecordedJob,
        text: row.content,
      }
    );
  }

  /** What has been written down of a job that is under way, or `undefined`. */
  findUnderWay(jobRef: string): Moneyed | undefined {
    return contentUnderWay(this.connection, this.branch.id, jobRef);
  }

  /** Writes a job that was not there. */
  createJob(jobRef: string, job: RecordedJob, text: string, receipt: Receipt): void {
    const entry = this.packageOf(job);
    const { lastInsertRowid } = this.connection
      .prepare(
        'insert into jobs (branch_id, job_ref, revision, warranty_months) values (?, ?, 1, ?)',
      )
      .run(this.branch.id, jobRef, entry.warrantyMonths);
    const jobId = Number(lastInsertRowid);
    this.addRevision(jobId, 1, 'created', text, receipt);
    this.writeRows(this.identity(jobId, jobRef, 1, entry), job);
    endUnderWay(this.connection, this.branch.id, jobRef);
  }

  /** Writes a new revision of a job; one that was voided comes back with it. */
  replaceJob(
    jobRef: string,
    stored: StoredJob,
    job: RecordedJob,
    text: string,
    receipt: Receipt,
  ): number {
    const revision = stored.revision + 1;
    const entry = this.packageOf(job);
    // Warranty already sold keeps its length unless the package itself is corrected (rule 10).
    const warrantyMonths =
      job.package === stored.content.package ? stored.warrantyMonths : entry.warrantyMonths;
    this.connection
      .prepare('update jobs set revision = ?, warranty_months = ?, voided_at = null where id = ?')
      .run(revision, warrantyMonths, stored.id);
    this.addRevision(stored.id, revision, stored.voided ? 'restored' : 'replaced', text, receipt);
    this.removeRows(stored.id);
    this.writeRows(this.identity(stored.id, jobRef, revision, { ...entry, warrantyMonths }), job);
    endUnderWay(this.connection, this.branch.id, jobRef);
    this.audit(stored.voided ? 'job.restore' : 'job.correct', jobRef, receipt, {
      revision,
      before: stored.content,
      after: job,
    });
    return revision;
  }

  /** Takes a job out of every figure; its revisions stay in the record and the trail says who did it. */
  voidJob(jobRef: string, stored: StoredJob, receipt: Receipt): void {
    this.connection
      .prepare('update jobs set voided_at = ? where id = ?')
      .run(receipt.receivedAt, stored.id);
    this.removeRows(stored.id);
    this.audit('job.void', jobRef, receipt, { revision: stored.revision, before: stored.content });
  }

  /**
   * Brings a voided job back as it was, under the revision it had: its rows are derived anew, its claims and the marks on what
   * was left hang on it still.
   */
  restoreJob(jobRef: string, stored: StoredJob, receipt: Receipt): void {
    this.connection.prepare('update jobs set voided_at = null where id = ?').run(stored.id);
    const { id } = this.packageOf(stored.content);
    const entry = { id, warrantyMonths: stored.warrantyMonths };
    this.writeRows(this.identity(stored.id, jobRef, stored.revision, entry), stored.content);
    this.audit('job.restore', jobRef, receipt, {
      revision: stored.revision,
      after: stored.content,
    });
  }

  /** The earliest day on which a claim was made on the job of a reference, or `undefined`. */
  firstClaimOn(jobRef: string): string | undefined {
    const row = this.connection
      .prepare(
        `select min(made_on) as made_on from claims where job_id =
          (select id from jobs where branch_id = ? and job_ref = ?)`,
      )
      .get(this.branch.id, jobRef) as { made_on: string | null };
    return row.made_on ?? undefined;
  }

  /**
   * Who changed a job last and when, in words, or `undefined` when it was never there. On the writing connection: the change
   * may be of the commit that is under way.
   */
  lastChange(jobRef: string): string | undefined {
    const stored = this.findJob(jobRef);
    if (stored?.voided === true) {
      const db = new UnscopedDb(this.connection);
      const event = findLastEvent(db, 'job.void', this.subjectOf(jobRef));
      return event && `voided by ${event.actor} at ${event.at}`;
    }
    const row = this.connection
      .prepare(
        `select job_revisions.revision, received_at as receivedAt, people.name as personName,
          push_keys.label as keyLabel from job_revisions
          left join people on people.id = person_id
          left join push_keys on push_keys.id = push_key_id
          where job_id = ? and job_revisions.revision = ?`,
      )
      .get(stored?.id, stored?.revision) as SentRevision | undefined;
    return row && tellRevision(row);
  }

  private subjectOf(jobRef: string): string {
    return `/branches/${this.branch.code}/jobs/${jobRef}`;
  }

  private packageOf(job: RecordedJob): { id: number; warrantyMonths: number } {
    const entry = this.state.package(job.package);
    if (!entry) throw new Error('a job names a package that is gone');
    return entry;
  }

  private identity(
    jobId: number,
    jobRef: string,
    revision: number,
    entry: { id: number; warrantyMonths: number },
  ): JobIdentity {
    return {
      jobId,
      branchId: this.branch.id,
      jobRef,
      revision,
      packageId: entry.id,
      warrantyMonths: entry.warrantyMonths,
    };
  }

  private addRevision(
    jobId: number,
    revision: number,
    change: JobChange,
    text: string,
    receipt: Receipt,
  ): void {
    this.connection
      .prepare(
        `insert into job_revisions
          (job_id, revision, change, content, received_at, source, person_id, push_key_id)
          values (?, ?, ?, ?, ?, ?, ?, ?)`,
      )
      .run(
        jobId,
        revision,
        change,
        text,
        receipt.receivedAt,
        receipt.source,
        receipt.actor.personId,
        receipt.actor.pushKeyId,
      );
  }

  private writeRows(id: JobIdentity, job: RecordedJob): void {
    insertReceived(this.connection, id, this.branch.code, job, this.state);
    const finding = this.connection.prepare(
      `insert into job_findings (job_id, ref, branch_id, zone, side, seen_as, worked_as, structural,
        action, repair_minutes, charged_cents, completed_on, vehicle_key)
        values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
    );
    for (const found of job.findings ?? []) {
      finding.run(
        id.jobId,
        found.ref,
        id.branchId,
        found.zone,
        found.side,
        found.seenAs,
        found.workedAs ?? null,
        found.structural ? 1 : 0,
        found.action,
        found.repairMinutes ?? 0,
        found.chargedCents ?? 0,
        job.completedOn,
        job.vehicle.key ?? null,
      );
    }
    (job.consumables ?? []).forEach((line, index) => {
      this.connection
        .prepare('insert into job_consumables values (?, ?, ?, ?, ?, ?)')
        .run(id.jobId, index, id.branchId, line.kind, line.quantity, line.unitCostCents ?? null);
    });
    (job.agreedExtras ?? []).forEach((extra, index) => {
      this.connection
        .prepare('insert into job_extras values (?, ?, ?, ?, ?, ?, ?)')
        .run(
          id.jobId,
          index,
          id.branchId,
          extra.on,
          extra.minutes ?? 0,
          extra.priceCents ?? 0,
          extra.note ?? null,
        );
    });
  }

  private removeRows(jobId: number): void {
    removeDerived(this.connection, jobId);
    for (const table of ['job_findings', 'job_consumables', 'job_extras']) {
      this.connection.prepare(`delete from ${table} where job_id = ?`).run(jobId);
    }
  }

  private audit(
    action: string,
    jobRef: string,
    receipt: Receipt,
    detail: Record<string, unknown>,
  ): void {
    recordAudit(new UnscopedDb(this.connection), {
      at: receipt.receivedAt,
      actor: receipt.actor,
      action,
      subject: this.subjectOf(jobRef),
      branchId: this.branch.id,
      detail,
    });
  }
}
