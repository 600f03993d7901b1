import type { Knex } from 'knex';
import type { ClaimDecision, Source } from '#shared/domain/vocabulary';
import type { RecordedClaim } from '../claim-writer';
import type { ScopedDb } from '../scoped-db';

/** A claim whose job is not voided, or `undefined`. */
export function findClaim(
  db: ScopedDb,
  branch: string,
  claimRef: string,
):
  | {
      revision: number;
      decision: ClaimDecision;
      proposed: ClaimDecision | null;
      /** Days of the decision that counts. */
      decidedOn: string | null;
      paidOn: string | null;
      content: RecordedClaim;
    }
  | undefined {
  const row = db.first<{
    revision: number;
    decision: ClaimDecision;
    proposed: ClaimDecision | null;
    decidedOn: string | null;
    paidOn: string | null;
    content: string;
  }>(
    standingClaim(db, branch, claimRef)
      .join('claim_revisions', (join) =>
        join
          .on('claim_revisions.claim_id', 'claims.id')
          .andOn('claim_revisions.revision', 'claims.revision'),
      )
      .select({
        revision: 'claims.revision',
        decision: 'claims.decision',
        proposed: 'claims.proposed_decision',
        decidedOn: 'claims.decided_on',
        paidOn: 'claims.paid_on',
        content: 'claim_revisions.content',
      }),
  );
  return row && { ...row, content: JSON.parse(row.content) as RecordedClaim };
}

/** A revision of a claim as it was sent, with what counted from it on. */
export interface ClaimRevisionRow {
  revision: number;
  content: RecordedClaim;
  decision: ClaimDecision;
  proposedDecision: ClaimDecision | null;
  receivedAt: string;
  source: Source;
  personName: string | null;
  keyLabel: string | null;
}

/** Every revision of a claim whose job is not voided, oldest first, with who sent it; none when there is no such claim. */
export function listClaimRevisions(
  db: ScopedDb,
  branch: string,
  claimRef: string,
): ClaimRevisionRow[] {
  return db
    .all<Omit<ClaimRevisionRow, 'content'> & { content: string }>(
      standingClaim(db, branch, claimRef)
        .join('claim_revisions', 'claim_revisions.claim_id', 'claims.id')
        .leftJoin('people', 'people.id', 'claim_revisions.person_id')
        .leftJoin('push_keys', 'push_keys.id', 'claim_revisions.push_key_id')
        .orderBy('claim_revisions.revision')
        .select({
          revision: 'claim_revisions.revision',
          content: 'claim_revisions.content',
          decision: 'claim_revisions.decision',
          proposedDecision: 'claim_revisions.proposed_decision',
          receivedAt: 'claim_revisions.received_at',
          source: 'claim_revisions.source',
          personName: 'people.name',
          keyLabel: 'push_keys.label',
        }),
    )
    .map((row) => ({ ...row, content: JSON.parse(row.content) as RecordedClaim }));
}

/** Whether there is a claim of a branch whose job is not voided. */
export function standsClaim(db: ScopedDb, branchId: number, claimRef: string): boolean {
  const claim = db
    .table('claims')
    .join(db.derived('jobs'), 'jobs.id', 'claims.job_id')
    .where({ 'claims.branch_id': branchId, claim_ref: claimRef })
    .whereNull('jobs.voided_at')
    .select('claims.id');
  return db.first(claim) !== undefined;
}

/** While its job is voided a claim is absent (rule 59). */
function standingClaim(db: ScopedDb, branch: string, claimRef: string): Knex.QueryBuilder {
  return db
    .table('claims')
    .join(db.derived('jobs'), 'jobs.id', 'claims.job_id')
    .join('branches', 'branches.id', 'claims.branch_id')
    .where({ 'branches.code': branch, 'claims.claim_ref': claimRef, 'jobs.voided_at': null });
}
