import type { BranchWriter } from './branch-writer';
import type { FieldProblem } from '#shared/contracts/fields';
import { isDate } from '#shared/domain/calendar';

/** A correction may not move completion past a claim already made on the job (rule 59). Over a body of any shape. */
export function breaksOfClaims(
  record: Pick<BranchWriter, 'firstClaimOn'>,
  jobRef: string,
  body: unknown,
): FieldProblem[] {
  const completedOn =
    typeof body === 'object' && body !== null && 'completedOn' in body && body.completedOn;
  if (typeof completedOn !== 'string' || !isDate(completedOn)) return [];
  const claimed = record.firstClaimOn(jobRef);
  if (claimed === undefined || completedOn <= claimed) return [];
  return [
    {
      path: '/completedOn',
      message: `a claim was made on this job on ${claimed}; completion cannot be later`,
    },
  ];
}
