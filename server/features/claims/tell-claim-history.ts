import { listClaimRevisions, type ClaimRevisionRow } from '#db/queries/claims';
import type { ScopedDb } from '#db/scoped-db';
import type { getClaimHistory } from '#shared/contracts/claim-list';
import type { OutOf } from '#shared/contracts/endpoint';
import { claimChanges } from '#shared/domain/claim-changes';
import { senderOf } from '#shared/domain/preconditions';
import { notFound } from '#shared/domain/refusal';

type ClaimHistory = OutOf<typeof getClaimHistory>;

/** Every revision of a claim, the newest first, with what changed, for one who sees money or one who does not. */
export function tellClaimHistory(
  db: ScopedDb,
  branch: string,
  claimRef: string,
  money: 'seen' | 'unseen',
): ClaimHistory {
  const rows = listClaimRevisions(db, branch, claimRef);
  if (rows.length === 0) throw notFound();
  const items = rows.map((row, index) => {
    const before = rows[index - 1];
    return {
      revision: row.revision,
      receivedAt: row.receivedAt,
      source: row.source,
      by: senderOf(row),
      change: before ? ('replaced' as const) : ('created' as const),
      changes: before ? claimChanges(asItStood(before), asItStood(row), money) : [],
    };
  });
  return { items: items.reverse() };
}

/** A revision with the decision that counted from it on in the place of the one it says, which may have been a proposal only (rule 77). */
function asItStood({ content, decision, proposedDecision }: ClaimRevisionRow): object {
  const { decision: _said, ...rest } = content;
  return { decision, proposedDecision: proposedDecision ?? undefined, ...rest };
}
