import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { formatCounted, formatDate, formatExactMoney } from '../../../ui/format';

/** What the figures of a report do not hold, each with its count; what there is none of is said too. */
export function leftOut({ answer, asOf, currency }: WarrantyReport): readonly string[] {
  const { left, evaluatedOn } = answer;
  return [
    `${formatCounted(left.carsWithoutWarranty, 'car', 'cars')} sold without a warranty.`,
    `${formatCounted(left.claimsAfterEnd, 'claim', 'claims')} made after the warranty had ended.`,
    `${formatCounted(left.claimsRefused, 'claim', 'claims')} refused by the as-of day.`,
    `Decisions and payments of ${formatCounted(left.claimsWaiting, 'claim', 'claims')} above the claim limit that wait for head office; the claims themselves count.`,
    `${formatExactMoney(left.paidAfterEvaluationCents, currency)} paid after ${formatDate(evaluatedOn)}, up to ${formatDate(asOf)}: what is paid is added up by whole half-years.`,
    'What claims that are open or waiting will cost, beyond what the half-years before them lead one to expect.',
    'Cost that comes later than the oldest half-year of age seen so far: nothing is added for it.',
  ];
}
