import type { ClaimSort } from './claim-filters';

/** An order of the list, in words. */
export interface SortWords {
  readonly sort: ClaimSort;
  readonly words: string;
  readonly of: 'work' | 'money';
}

const SORTS: readonly SortWords[] = [
  { sort: 'made', words: 'last made first', of: 'work' },
  { sort: 'completed', words: 'newest cars first', of: 'work' },
  { sort: 'cost', words: 'dearest first', of: 'money' },
];

/** The orders on offer; those by money only where money is shown. */
export function sortsFor(money: 'shown' | 'hidden'): readonly SortWords[] {
  return SORTS.filter((one) => one.of === 'work' || money === 'shown');
}
