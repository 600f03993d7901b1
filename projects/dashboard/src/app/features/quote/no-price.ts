import type { QuoteAnswer } from '#shared/contracts/quote';
import { CONSUMABLE_KINDS } from '#shared/domain/vocabulary';
import { CONSUMABLE_NAMES } from '../../ui/words';
import { shareWords } from './quote-sentences';

/** Names of what a cost may be missing of. */
export interface CostNames {
  readonly branchName: (code: string) => string;
  readonly productName: (code: string) => string;
}

/** Why there is no price and what to do, in sentences; `undefined` where there is one. */
export function noPriceWords(
  { noPrice, cost }: Pick<QuoteAnswer, 'noPrice' | 'cost'>,
  names: CostNames,
): string | undefined {
  switch (noPrice) {
    case null:
      return undefined;
    case 'no_cars':
      return 'A price is made from at least 30 cars. Price this one by hand.';
    case 'no_target':
      return cost
        ? 'Neither the branch nor the network has a target margin. Write the margin wanted above, or have head office set a target.'
        : 'Neither the branch nor the network has a target margin. A site manager can quote with a margin of their own.';
    case 'target_too_high':
      return cost?.marginFrom === 'asked'
        ? `The margin wanted and the network fee${feeWords(cost)} leave nothing of the price to pay for the work. Ask for less.`
        : 'The target margin and the network fee leave nothing of the price to pay for the work. Head office sets both.';
    case 'no_cost':
      return `A cost of today is missing${missingWords(cost, names)}. Head office fills it in.`;
  }
}

function feeWords({ feeRate }: NonNullable<QuoteAnswer['cost']>): string {
  return feeRate === null ? '' : ` (${shareWords(feeRate)})`;
}

function missingWords(cost: QuoteAnswer['cost'], names: CostNames): string {
  const missing = (cost?.missingCosts ?? []).map(({ kind, code }) => {
    switch (kind) {
      case 'hourlyCost':
        return `the hourly cost of ${names.branchName(code)}`;
      case 'product':
        return names.productName(code);
      case 'consumable': {
        const known = CONSUMABLE_KINDS.find((one) => one === code);
        return known ? CONSUMABLE_NAMES[known] : code;
      }
      default:
        return 'the network fee';
    }
  });
  return missing.length > 0 ? `: ${missing.join(', ')}` : '';
}
