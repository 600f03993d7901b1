import type { ClaimSending } from '#db/accept-claim';
import type { Actor } from '#db/queries/audit';

/** Who sends, corrects or confirms a file, when, and what they may decide of claims (rule 77). */
export interface ImportSender {
  actor: Actor & { personId: number };
  at: string;
  claims: Pick<ClaimSending, 'role' | 'limitCents'>;
}
