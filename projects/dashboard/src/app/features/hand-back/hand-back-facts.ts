import type { JobSheet } from '#shared/contracts/jobs';
import { addMonths } from '#shared/domain/calendar';
import { CHECKS, type CheckAnswer, type ProductKind } from '#shared/domain/vocabulary';
import { formatCounted, formatDate, formatVolume } from '../../ui/format';
import { CHECK_NAMES } from '../../ui/words';

/** A line of the sheet: what, and what is said of it. */
export interface HandedFact {
  readonly name: string;
  readonly text: string;
}

/** What each kind of product is there for, to someone who does not know the trade. */
const KIND_WORDS: Readonly<Record<ProductKind, string>> = {
  cavity_wax: 'thin wax inside the closed hollows',
  underbody_wax: 'thick wax over the underbody',
  stone_chip: 'coat against stones, where wheels throw',
  rust_converter: 'converter on cleaned rust',
  zinc_primer: 'zinc primer on bare metal',
  seam_sealer: 'sealer in seams',
};

/** What went on the car, in plain words; several lines of one product are one. No money. */
export function productFacts(
  job: JobSheet,
  catalogue: readonly {
    readonly code: string;
    readonly name: string;
    readonly kind: ProductKind;
  }[],
): readonly HandedFact[] {
  const used = new Map<string, number>();
  for (const { product, ml } of job.products ?? []) {
    used.set(product, (used.get(product) ?? 0) + ml);
  }
  return [...used]
    .filter(([, ml]) => ml > 0)
    .map(([code, ml]) => {
      const known = catalogue.find((product) => product.code === code);
      return {
        name: known ? `${known.name}: ${KIND_WORDS[known.kind]}` : code,
        text: formatVolume(ml),
      };
    });
}

const ANSWERS: Readonly<Record<CheckAnswer, string>> = {
  yes: 'done',
  no: 'not done',
  na: 'does not apply',
};

/** What was checked while the work went on. */
export function checkFacts({ checks }: JobSheet): readonly HandedFact[] {
  return CHECKS.map((check) => {
    const answer = checks?.[check];
    return { name: CHECK_NAMES[check], text: answer ? ANSWERS[answer] : 'not recorded' };
  });
}

/** Months of warranty and their last day. */
export function warrantyWords({ warrantyMonths: months, completedOn }: JobSheet): string {
  return months > 0
    ? `${formatCounted(months, 'month', 'months')}, to ${formatDate(addMonths(completedOn, months))}`
    : 'none';
}
