import { corrosionRate } from '#shared/stats/iso-corrosivity';
import { formatNumber } from '../format';
import type { Climate } from './region-changes';

/** How a climate rusts bare steel, in words. */
export interface CorrosivityWords {
  readonly rate: string;
  readonly category: string;
  /** That the formula was not made for such air; nothing where it was. */
  readonly caveat: string | undefined;
}

const CATEGORY_NAMES = {
  C1: 'very low',
  C2: 'low',
  C3: 'medium',
  C4: 'high',
  C5: 'very high',
  CX: 'extreme',
} as const;

/** The first year's corrosion of bare carbon steel in a climate (ISO 9223), and its category. */
export function corrosivityWords(climate: Climate): CorrosivityWords {
  const { umPerYear, category, outsideFittedRange } = corrosionRate(climate);
  return {
    rate: `${formatNumber(umPerYear, umPerYear < 10 ? 1 : 0)}\u202fµm a year`,
    category: category
      ? `${category}, ${CATEGORY_NAMES[category]}`
      : 'above CX: the standard names no category',
    caveat: outsideFittedRange
      ? 'Outside the fitted range: the formula was made from milder or cleaner places; take the figure as a hint.'
      : undefined,
  };
}
