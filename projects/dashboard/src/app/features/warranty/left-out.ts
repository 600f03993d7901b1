import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { CellLink } from '../../ui/data-table/column';
import { formatCounted, formatDate, formatExactMoney } from '../../ui/format';
import type { WarrantyLinks } from './warranty-links';
import type { WarrantyWords } from './warranty-words';

/** Something that stands outside the figures, or in them and not yet decided. */
export interface LeftOut {
  readonly words: string;
  /** Where it is listed, if it is a list. */
  readonly link?: CellLink;
}

/** What is not in the figures, counted; nothing that is none. */
export function leftOut(
  { left, evaluatedOn }: WarrantyAnswer,
  words: WarrantyWords,
  links: WarrantyLinks,
): LeftOut[] {
  return [
    ...(left.carsWithoutWarranty > 0
      ? [
          {
            words: `${formatCounted(left.carsWithoutWarranty, 'car', 'cars')} sold without a warranty`,
          },
        ]
      : []),
    ...(left.claimsAfterEnd > 0
      ? [
          {
            words: `${formatCounted(left.claimsAfterEnd, 'claim', 'claims')} made after the warranty’s end`,
            link: links.claims({ counted: 'false' }),
          },
        ]
      : []),
    ...(left.claimsRefused > 0
      ? [
          {
            words: `${formatCounted(left.claimsRefused, 'claim', 'claims')} refused`,
            link: links.claims({ counted: 'false', decision: 'refused' }),
          },
        ]
      : []),
    ...(left.paidAfterEvaluationCents > 0
      ? [
          {
            words: `${formatExactMoney(left.paidAfterEvaluationCents, words.currency)} paid after ${formatDate(evaluatedOn)}, which is still among what is to come`,
          },
        ]
      : []),
  ];
}

/** Claims above the limit that wait for head office: they count, their payment does not yet. */
export function waitingClaims({ left }: WarrantyAnswer, links: WarrantyLinks): LeftOut | null {
  if (left.claimsWaiting === 0) return null;
  return {
    words: formatCounted(left.claimsWaiting, 'claim waits', 'claims wait'),
    link: links.claims({ counted: undefined, waiting: 'true' }),
  };
}
