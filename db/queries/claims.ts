import type { ClaimDecision } from '#shared/domain/vocabulary';
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
      content: RecordedClaim;
    }
  | undefined {
  const row = db.first<{
    revision: number;
    decision: ClaimDecision;
    proposed: ClaimDecision | null;
    content: string;
  }>(
    db
      .table('claims')
      .join(db.derived('jobs'), 'jobs.id', 'claims.job_id')
      .join('branches', 'branches.id', 'claims.branch_id')
      .join('claim_revisions', (join) =>
        join
          .on('claim_revisions.claim_id', 'claims.id')
          .andOn('claim_revisions.revision', 'claims.revision'),
      )
      .where({ 'branches.code': branch, 'claims.claim_ref': claimRef, 'jobs.voided_at': null })
      .select({
        revision: 'claims.revision',
        decision: 'claims.decision',
        proposed: 'claims.proposed_decision',
        content: 'claim_revisions.content',
      }),
  );
  return row && { ...row, content: JSON.parse(row.content) as RecordedClaim };
}
