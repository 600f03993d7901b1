import type { ClaimBody, ReadClaim } from './typed-claim';

/**
 * Whether the claim that the server holds is the one that was sent: then an answer was lost on the way, and nobody else was first.
 * A decision above the limit stands there as a proposal; a cost that the sender may not see is left aside.
 */
export function isSameClaim(sent: ClaimBody, held: ReadClaim): boolean {
  return (
    sent.jobRef === held.jobRef &&
    sent.madeOn === held.madeOn &&
    sent.zone === held.zone &&
    sent.side === held.side &&
    sent.cause === held.cause &&
    sent.decision === (held.proposedDecision ?? held.decision) &&
    sent.decidedOn === held.decidedOn &&
    sent.paidOn === held.paidOn &&
    (sent.labourMinutes ?? 0) === held.labourMinutes &&
    (sent.productMl ?? 0) === held.productMl &&
    (sent.note ?? '').normalize('NFC') === (held.note ?? '') &&
    (held.costCents === undefined || (sent.costCents ?? 0) === held.costCents)
  );
}
