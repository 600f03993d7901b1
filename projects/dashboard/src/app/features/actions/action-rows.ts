import type { Action } from '#shared/contracts/actions';
import { formatCounted, formatShortDate } from '../../ui/format';
import { MEASURE_NAMES } from '../../ui/measure-words';
import { standingWords } from './action-words';

/** An action as a row of the list says it. */
export interface ActionRow {
  readonly key: string;
  readonly link: readonly unknown[];
  readonly what: string;
  readonly where: string;
  readonly who: string;
  readonly until: string;
  readonly measure: string;
  readonly stands: string;
  readonly late: boolean;
  readonly answers: string;
}

/** Turns an action into its row. */
export function actionRow(action: Action, branchName: string): ActionRow {
  const { branch, id, what, who, until, measure, late, answers } = action;
  return {
    key: `${branch}/${id}`,
    link: ['/actions', branch, id],
    what,
    where: branchName,
    who,
    until: formatShortDate(until),
    measure: MEASURE_NAMES[measure],
    stands: standingWords(action),
    late,
    answers:
      answers.length === 0 ? 'no answer yet' : formatCounted(answers.length, 'answer', 'answers'),
  };
}
