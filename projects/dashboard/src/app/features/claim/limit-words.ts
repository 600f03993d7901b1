import type { Role } from '#shared/domain/vocabulary';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { formatExactMoney } from '../../ui/format';
import { typedCost } from './typed-claim';

/** What a decision is judged by (rule 77). */
export interface DecisionLimit {
  readonly role: Role | undefined;
  /** `null`: there is none. */
  readonly limitCents: number | null | undefined;
  readonly currency: string;
}

/** Who decides, before it is sent: up to the limit a branch, above it head office, to which the decision goes as a proposal. */
export function limitWords(
  typed: Pick<TypedClaim, 'cost' | 'decision'>,
  { role, limitCents, currency }: DecisionLimit,
): { readonly words: string; readonly tone: 'quiet' | 'waits' } | undefined {
  if (role !== 'site_manager' || limitCents === null || limitCents === undefined) return undefined;
  const limit = formatExactMoney(limitCents, currency);
  const above = (typedCost(typed) ?? 0) > limitCents;
  if (!above) {
    return { tone: 'quiet', words: `Up to ${limit} the branch decides, above it head office.` };
  }
  return {
    tone: 'waits',
    words:
      typed.decision === 'open'
        ? `The cost is above ${limit}: head office decides this claim. Choose what you propose.`
        : `The cost is above ${limit}: head office decides. What you choose here waits as your proposal until then.`,
  };
}
