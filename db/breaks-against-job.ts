import type { ClaimWriter } from './claim-writer';
import { reference, type FieldProblem } from '#shared/contracts/fields';
import { isDate } from '#shared/domain/calendar';

/** A claim is made on a job of the branch that is not voided, and not before its completion (rule 59). Over a body of any shape. */
export function breaksAgainstJob(
  record: Pick<ClaimWriter, 'findJob'>,
  body: unknown,
): FieldProblem[] {
  if (typeof body !== 'object' || body === null) return [];
  const { jobRef, madeOn } = body as Record<string, unknown>;
  const ref = reference.safeParse(jobRef);
  if (!ref.success) return [];
  const job = record.findJob(ref.data);
  if (!job) return [{ path: '/jobRef', message: 'no job of this branch has this reference' }];
  if (typeof madeOn !== 'string' || !isDate(madeOn) || madeOn >= job.completedOn) return [];
  return [{ path: '/madeOn', message: `is before the job was completed (${job.completedOn})` }];
}
