import type { BridgeStep } from '#shared/domain/bridge';
import type { MarginAnswer } from '#shared/contracts/margin';
import type { Role } from '#shared/domain/vocabulary';
import { formatCount, formatDate, formatList, formatNumber } from '../../ui/format';

/** What the page needs to turn codes and cents into words. */
export interface WeekWords {
  /** ISO 4217 code. */
  readonly currency: string;
  /** Today in the scope. */
  readonly today: string;
  readonly branchName: (code: string) => string;
  readonly packageName: (code: string) => string;
  readonly productName: (code: string) => string;
  /** Whose usual range it is: "this branch’s", "the network’s". */
  readonly whose: string;
}

/** The steps of the bridge as they stand in its rows. */
export const STEP_LABELS: Readonly<Record<BridgeStep, string>> = {
  price: 'Price',
  plannedLabour: 'Planned labour',
  rotLabour: 'Rot labour',
  product: 'Product',
  consumables: 'Consumables, bought-in',
  fee: 'Fee',
};

/** The steps inside a sentence or a cell. */
export const STEP_WORDS: Readonly<Record<BridgeStep, string>> = {
  price: 'price',
  plannedLabour: 'planned labour',
  rotLabour: 'rot labour',
  product: 'product',
  consumables: 'consumables and bought-in',
  fee: 'fee',
};

const SMALL_NUMBERS = [
  ...['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'],
  ...['Eleven', 'Twelve'],
];

/** A count at the start of a sentence: spelled out up to twelve. */
export function countAtStart(count: number): string {
  return SMALL_NUMBERS[count] ?? formatCount(count);
}

/** "8 points", "1 point": a part of what was billed, in whole points of margin. */
export function points(share: number): string {
  const whole = Math.round(Math.abs(share) * 100);
  return whole === 1 ? '1 point' : `${formatCount(whole)} points`;
}

/** A p-value with no more digits than it bears: "p = 0.7", "p = 0.03", "p < 0.001". */
export function pValue(p: number): string {
  if (p < 0.001) return 'p < 0.001';
  const decimals = p >= 0.0995 ? 1 : p >= 0.00995 ? 2 : 3;
  return `p = ${formatNumber(p, decimals)}`;
}

/** "8th", "21st": which in a row. */
export function ordinal(count: number): string {
  const tens = count % 100;
  if (tens >= 11 && tens <= 13) return `${count}th`;
  return `${count}${['th', 'st', 'nd', 'rd'][count % 10] ?? 'th'}`;
}

/**
 * Whose usual range the limits are. `wide` readers see whole regions or the network unless they chose branches; others see the
 * branches they were given.
 */
export function whoseUsual(
  scope: MarginAnswer['scope'],
  reader: {
    readonly role: Role | undefined;
    readonly choseBranches: boolean;
    readonly choseRegions: boolean;
  },
): string {
  if (scope.branches.length === 1) return 'this branch’s';
  const wide = reader.role === 'regional_lead' || reader.role === 'head_office';
  if (!wide || reader.choseBranches) return 'these branches’';
  if (scope.regions.length === 1) return 'this region’s';
  return reader.role === 'head_office' && !reader.choseRegions ? 'the network’s' : 'these regions’';
}

type MissingCost = MarginAnswer['missingCosts'][number];
const NAMED_AT_MOST = 2;

/** Which costs are not known: "the hourly cost of Havnsund from 28 January 2026 and 3 more". */
export function missingCostWords(missing: readonly MissingCost[], words: WeekWords): string {
  const named = missing.slice(0, NAMED_AT_MOST).map((one) => missingCostWord(one, words));
  const rest = missing.length - named.length;
  return formatList(rest > 0 ? [...named, `${formatCount(rest)} more`] : named);
}

function missingCostWord({ kind, code, on }: MissingCost, words: WeekWords): string {
  const day = formatDate(on);
  switch (kind) {
    case 'hourlyCost':
      return `the hourly cost of ${words.branchName(code)} from ${day}`;
    case 'product':
      return `the cost of ${words.productName(code)} from ${day}`;
    case 'consumable':
      return `the cost of ${code.replaceAll('_', ' ')}s from ${day}`;
    case 'fee':
      return `the network fee from ${day}`;
  }
}
