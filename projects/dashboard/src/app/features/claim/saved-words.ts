import type { putClaim } from '#shared/contracts/claims';
import type { OutOf } from '#shared/contracts/endpoint';
import { CLAIM_DECISION_NAMES } from '../../ui/words';

/** What saving a claim came to. */
export function savedWords({ status, decision, proposedDecision }: OutOf<typeof putClaim>): string {
  if (proposedDecision) {
    return `Saved. The cost is above the branch's limit: ${CLAIM_DECISION_NAMES[proposedDecision]} waits as a proposal until head office decides.`;
  }
  if (status === 'unchanged') return 'The claim stands as it was: nothing differs.';
  return decision === 'open'
    ? 'Saved. The claim is open.'
    : `Saved. The claim is decided: ${CLAIM_DECISION_NAMES[decision]}.`;
}
