import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount } from '../../ui/format';
import type { FilterWords } from './job-filters';

/** How many cars the list holds and what it is narrowed to. */
export function jobsSentence(
  jobs: number,
  filters: readonly FilterWords[],
): { readonly sentence: readonly AnswerPart[]; readonly second: readonly AnswerPart[] } {
  const narrowed = filters.map((filter) => filter.words).join(', ');
  return {
    sentence: [{ figure: formatCount(jobs) }, jobs === 1 ? ' car finished' : ' cars finished'],
    second: narrowed ? [`Only those ${narrowed}.`] : [],
  };
}
