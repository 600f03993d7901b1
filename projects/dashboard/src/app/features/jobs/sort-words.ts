import type { JobSort } from './job-filters';

/** An order of the list, in words. */
export interface SortWords {
  readonly sort: JobSort;
  readonly words: string;
  readonly of: 'work' | 'money';
}

const SORTS: readonly SortWords[] = [
  { sort: 'completed', words: 'newest first', of: 'work' },
  { sort: 'overrun', words: 'most over the estimate first', of: 'work' },
  { sort: 'waiting', words: 'longest unbilled first', of: 'work' },
  { sort: 'margin', words: 'least kept first', of: 'money' },
  { sort: 'difference', words: 'furthest below expected first', of: 'money' },
];

/** The orders on offer; those by money only where money is shown. */
export function sortsFor(money: 'shown' | 'hidden'): readonly SortWords[] {
  return SORTS.filter((one) => one.of === 'work' || money === 'shown');
}
