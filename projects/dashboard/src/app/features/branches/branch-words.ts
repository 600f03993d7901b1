import type { BranchesAnswer, BranchStanding } from '#shared/contracts/branches';
import {
  AGE_BANDS,
  type BranchMeasure,
  CLAIM_CAUSES,
  type FunnelFlag,
  STAGES,
} from '#shared/domain/vocabulary';
import { amountOfChange, formatMeasure, formatMeasureChange } from '../../ui/measure-words';
import { CLAIM_CAUSE_NAMES, STAGE_NAMES } from '../../ui/words';

/** Names that the page's words need. */
export interface BranchWords {
  readonly branchName: (code: string) => string;
  readonly productName: (code: string) => string;
}

/** What branches are compared by, as the chips say it. */
export const MEASURE_CHIPS: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'Overrun',
  rot: 'Rot',
  claims: 'Claims',
  product: 'Product',
  margin: 'Margin',
};

/** Read after "on": "stand outside the funnel on overrun". */
export const MEASURE_ON: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'overrun',
  rot: 'rot found',
  claims: 'claims',
  product: 'product use',
  margin: 'margin',
};

/** The value's unit, for headings. */
export const VALUE_UNITS: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'points of the estimate',
  rot: 'points of the share with rot',
  claims: 'claims per 1,000 car-years',
  product: 'points of the norm',
  margin: 'points of what was billed',
};

/** What a value's cars are: those the measure counts. */
export const COUNTED_CARS: Readonly<Record<BranchMeasure, string>> = {
  overrun: 'cars with an estimate',
  rot: 'cars',
  claims: 'cars sold with a warranty',
  product: 'cars with a norm',
  margin: 'cars billed',
};

/** The words of rule 44. */
export const FLAG_WORDS: Readonly<Record<FunnelFlag, string>> = {
  as_expected: 'as expected',
  below_95: 'below, outside the 95 % limits',
  above_95: 'above, outside the 95 % limits',
  below_998: 'below, outside the 99.8 % limits',
  above_998: 'above, outside the 99.8 % limits',
  too_few: 'too few cars yet',
};

/** Which side of its limits a flag lies on. */
export function standOf(flag: FunnelFlag): 'inside' | 'below' | 'above' {
  if (flag.startsWith('below')) return 'below';
  return flag.startsWith('above') ? 'above' : 'inside';
}

/** A branch that has a place in the funnel. */
export type Placed = BranchStanding & {
  readonly [K in 'value' | 'expected' | 'lower95' | 'upper95' | 'lower998' | 'upper998']: number;
};

/** The branches with a value and limits; the others are told, not drawn. */
export function placedOf({ branches }: Pick<BranchesAnswer, 'branches'>): Placed[] {
  return branches.filter(
    (one): one is Placed =>
      one.flag !== 'too_few' &&
      [one.value, one.expected, one.lower95, one.upper95, one.lower998, one.upper998].every(
        (limit) => limit !== null,
      ),
  );
}

/** "3 points above", "2.1 per 1,000 car-years below", "as much". */
export function apartWords(measure: BranchMeasure, apart: number): string {
  return `${formatMeasureChange(measure, apart)} ${apart < 0 ? 'below' : 'above'}`;
}

/** A step or difference with its sign, in the unit of the measure: "+3", "−0.4", "0". */
export function signedChange(measure: BranchMeasure, change: number): string {
  const amount = amountOfChange(measure, change);
  if (!/[1-9]/.test(amount)) return '0';
  return `${change < 0 ? '−' : '+'}${amount}`;
}

/** A value where there is one. */
export function valueText(measure: BranchMeasure, value: number | null): string {
  return value === null ? '' : formatMeasure(measure, value);
}

const COST_LINES: Readonly<Record<string, string>> = {
  revenue: 'price',
  plannedLabour: 'planned labour',
  rotLabour: 'rot labour',
  product: 'product',
  consumables: 'consumables, bought-in',
  fee: 'network fee',
};

/** A step in trade words; `mix` are the branch's own cars. */
export function stepName(measure: BranchMeasure, key: string, words: BranchWords): string {
  if (key === 'mix') return 'its mix of cars';
  switch (measure) {
    case 'overrun':
      return STAGE_NAMES[STAGES.find((stage) => stage === key) ?? 'strip'];
    case 'rot':
      return `rot in cars aged ${(AGE_BANDS.find((band) => band === key) ?? key).replace('-', '–')}`;
    case 'claims':
      return CLAIM_CAUSE_NAMES[CLAIM_CAUSES.find((cause) => cause === key) ?? 'not_covered'];
    case 'product':
      return words.productName(key);
    case 'margin':
      return COST_LINES[key] ?? key;
  }
}
