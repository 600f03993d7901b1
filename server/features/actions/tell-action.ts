import type { ActionRow } from '#db/queries/actions';
import type { Action } from '#shared/contracts/actions';

/** An action as answers tell it, as of a day of its branch. */
export function tellAction(row: ActionRow, today: string): Action {
  const { branchId: _, answers, ...told } = row;
  return {
    branch: told.branch,
    id: told.id,
    what: told.what,
    who: told.who,
    until: told.until,
    measure: told.measure,
    state: told.state,
    agreedOn: told.agreedOn,
    agreedBy: told.agreedBy,
    endedOn: told.endedOn,
    late: told.state === 'agreed' && told.until < today,
    signal: told.signal,
    answers: JSON.parse(answers) as Action['answers'],
  };
}
