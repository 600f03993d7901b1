import { claimPlace } from '../../ui/claims/claim-words';
import type { Fact } from '../../ui/fact-list/fact-list';
import { formatDate, formatExactMoney, formatMinutes, formatVolume } from '../../ui/format';
import { CLAIM_CAUSE_NAMES } from '../../ui/words';
import type { ReadClaim } from './typed-claim';

/** The claim as recorded, field by field; its cost only for those who see money. */
export function claimFacts(claim: ReadClaim, currency: string): readonly Fact[] {
  const { labourMinutes, productMl, costCents, decidedOn, paidOn } = claim;
  const proposed = claim.proposedDecision !== undefined;
  return [
    { name: 'Made on', text: formatDate(claim.madeOn) },
    { name: 'Where', text: claimPlace(claim.zone, claim.side) },
    { name: 'Why rust came back', text: CLAIM_CAUSE_NAMES[claim.cause] },
    { name: 'Labour put in', text: labourMinutes > 0 ? formatMinutes(labourMinutes) : 'none yet' },
    { name: 'Product put in', text: productMl > 0 ? formatVolume(productMl) : 'none yet' },
    ...(costCents === undefined
      ? []
      : [{ name: 'Cost before tax', text: formatExactMoney(costCents, currency) }]),
    ...(decidedOn
      ? [{ name: proposed ? 'Proposed on' : 'Decided on', text: formatDate(decidedOn) }]
      : []),
    {
      name: proposed && paidOn ? 'To be paid on, as proposed' : 'Paid on',
      text: paidOn ? formatDate(paidOn) : 'not paid',
    },
  ];
}
