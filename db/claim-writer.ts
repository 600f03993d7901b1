import { tellRevision, type SentRevision } from '#shared/domain/preconditions';
import { folded } from '#shared/domain/recorded-job';
import type { ClaimCause, ClaimDecision, Side, Zone } from '#shared/domain/vocabulary';
import type { Receipt } from './branch-writer';
import type { Connection } from './database';
import { recordAudit } from './queries/audit';
import type { ScopedBranch } from './scope';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';

/** A claim as it is kept: defaults left out, text in NFC. */
export interface RecordedClaim {
  jobRef: string;
  madeOn: string;
  zone: Zone;
  side?: Side;
  cause: ClaimCause;
  /** As sent; what counts is `StoredClaim.decision`. */
  decision: ClaimDecision;
  decidedOn?: string;
  labourMinutes?: number;
  productMl?: number;
  costCents?: number;
  paidOn?: string;
  note?: string;
}

export interface StoredClaim {
  id: number;
  revision: number;
  /** The decision that counts. */
  decision: ClaimDecision;
  /** One above the claim limit that waits for head office (rule 77). */
  proposed: ClaimDecision | null;
  /** When the decision that counts was taken and paid; those of a proposal wait with it. */
  decidedOn: string | null;
  paidOn: string | null;
  content: RecordedClaim;
  text: string;
}

export interface DecidedClaim {
  content: RecordedClaim;
  text: string;
  decision: ClaimDecision;
  proposed: ClaimDecision | null;
}

interface ClaimRow {
  id: number;
  revision: number;
  decision: ClaimDecision;
  proposed_decision: ClaimDecision | null;
  decided_on: string | null;
  paid_on: string | null;
  content: string;
}

/** Writes of one branch's claims; every method runs inside `WriteQueue.write`. */
export class ClaimWriter {
  private readonly connection: Connection;

  constructor(
    store: Pick<Store, 'writing'>,
    readonly branch: ScopedBranch,
  ) {
    this.connection = store.writing;
  }

  findClaim(claimRef: string): StoredClaim | undefined {
    const row = this.connection
      .prepare(
        `select claims.id, claims.revision, claims.decision, claims.proposed_decision, decided_on,
          paid_on, content from claims
          join claim_revisions on claim_id = claims.id and claim_revisions.revision = claims.revision
          where branch_id = ? and claim_ref = ?`,
      )
      .get(this.branch.id, claimRef) as ClaimRow | undefined;
    return (
      row && {
        id: row.id,
        revision: row.revision,
        decision: row.decision,
        proposed: row.proposed_decision,
        decidedOn: row.decided_on,
        paidOn: row.paid_on,
        content: JSON.parse(row.content) as RecordedClaim,
        text: row.content,
      }
    );
  }

  /** Who sent the newest revision of a claim and when, in words. */
  lastChange(claimId: number): string | undefined {
    const row = this.connection
      .prepare(
        `select claim_revisions.revision, received_at as receivedAt, people.name as personName,
          push_keys.label as keyLabel from claim_revisions
          left join people on people.id = person_id
          left join push_keys on push_keys.id = push_key_id
          where claim_id = ? order by claim_revisions.revision desc limit 1`,
      )
      .get(claimId) as SentRevision | undefined;
    return row && tellRevision(row);
  }

  /** The branch's job of a reference that is not voided: its id and completion day. */
  findJob(jobRef: string): { id: number; completedOn: string } | undefined {
    return this.connection
      .prepare(
        `select jobs.id, json_extract(content, '$.completedOn') as completedOn from jobs
          join job_revisions on job_id = jobs.id and job_revisions.revision = jobs.revision
          where branch_id = ? and job_ref = ? and voided_at is null`,
      )
      .get(this.branch.id, jobRef) as { id: number; completedOn: string } | undefined;
  }

  /** Writes a claim, new or as a further revision, and returns its revision. */
  keepClaim(
    claimRef: string,
    jobId: number,
    stored: StoredClaim | undefined,
    claim: DecidedClaim,
    receipt: Receipt,
  ): number {
    const revision = (stored?.revision ?? 0) + 1;
    const { content } = claim;
    const values = [
      jobId,
      revision,
      content.madeOn,
      content.zone,
      content.side ?? null,
      content.cause,
      claim.decision,
      claim.proposed,
      ...datesThatCount(stored, claim),
      content.labourMinutes ?? 0,
      content.productMl ?? 0,
      content.costCents ?? 0,
    ];
    const id = stored ? this.update(stored.id, values) : this.insert(claimRef, values);
    this.connection
      .prepare(
        `insert into claim_revisions
          (claim_id, revision, content, decision, proposed_decision, received_at, source, person_id,
            push_key_id)
          values (?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      )
      .run(
        id,
        revision,
        claim.text,
        claim.decision,
        claim.proposed,
        receipt.receivedAt,
        receipt.source,
        receipt.actor.personId,
        receipt.actor.pushKeyId,
      );
    recordAudit(new UnscopedDb(this.connection), {
      at: receipt.receivedAt,
      actor: receipt.actor,
      action: stored ? 'claim.correct' : 'claim.make',
      subject: `/branches/${this.branch.code}/claims/${claimRef}`,
      branchId: this.branch.id,
      detail: {
        revision,
        decision: claim.decision,
        proposed: claim.proposed,
        before: stored?.content ?? null,
        after: content,
      },
    });
    return revision;
  }

  private insert(claimRef: string, values: unknown[]): number {
    const { lastInsertRowid } = this.connection
      .prepare(
        `insert into claims (branch_id, claim_ref, search_text, job_id, revision, made_on, zone, side,
          cause, decision, proposed_decision, decided_on, paid_on, labour_minutes, product_ml, cost_cents)
          values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
      )
      .run(this.branch.id, claimRef, folded(claimRef), ...values);
    return Number(lastInsertRowid);
  }

  private update(id: number, values: unknown[]): number {
    this.connection
      .prepare(
        `update claims set job_id = ?, revision = ?, made_on = ?, zone = ?, side = ?, cause = ?,
          decision = ?, proposed_decision = ?, decided_on = ?, paid_on = ?, labour_minutes = ?,
          product_ml = ?, cost_cents = ? where id = ?`,
      )
      .run(...values, id);
    return id;
  }
}

/** Day of decision and of payment, in the order of the columns: what waits for head office is neither, whatever the branch's books say. */
function datesThatCount(
  stored: StoredClaim | undefined,
  { content, decision }: DecidedClaim,
): [decidedOn: string | null, paidOn: string | null] {
  if (decision === 'open') return [null, null];
  // The branch says otherwise: the decision that stands keeps its days.
  if (decision !== content.decision) return [stored?.decidedOn ?? null, stored?.paidOn ?? null];
  return [content.decidedOn ?? null, content.paidOn ?? null];
}
