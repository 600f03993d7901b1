import type { JobSheet } from '#shared/contracts/jobs';
import { formatDate } from '../../ui/format';
import { CONSUMABLE_NAMES } from '../../ui/words';
import { CONSUMABLE_KINDS } from '#shared/domain/vocabulary';

type MissingCost = NonNullable<JobSheet['missingCosts']>[number];

/** A cost that was not known on the job's day, in words. */
export function missingCostWords(
  cost: MissingCost,
  known: {
    readonly branchName: (code: string) => string;
    readonly productName: (code: string) => string;
  },
): string {
  const on = formatDate(cost.on);
  switch (cost.kind) {
    case 'hourlyCost':
      return `no hourly cost of ${known.branchName(cost.code)} is valid on ${on}`;
    case 'product':
      return `no cost of ${known.productName(cost.code)} is valid on ${on}`;
    case 'consumable':
      return `no cost of ${consumableName(cost.code)} is valid on ${on}`;
    default:
      return `no network fee is valid on ${on}`;
  }
}

function consumableName(code: string): string {
  const kind = CONSUMABLE_KINDS.find((one) => one === code);
  return kind ? CONSUMABLE_NAMES[kind] : code;
}
