import type { JobSheet } from '#shared/contracts/jobs';
import { addMonths } from '#shared/domain/calendar';
import { formatDate } from '../../ui/format';

/** The last day of a job's warranty (rule 16), or `undefined` where none was sold. */
export function warrantyEnd(
  job: Pick<JobSheet, 'completedOn' | 'warrantyMonths'>,
): string | undefined {
  return job.warrantyMonths > 0 ? addMonths(job.completedOn, job.warrantyMonths) : undefined;
}

/** Until when the job is covered, and what that means for a claim made on a day. */
export function coverWords(
  job: Pick<JobSheet, 'completedOn' | 'warrantyMonths'>,
  madeOn: string,
): { readonly words: string; readonly tone: 'covered' | 'over' } {
  const end = warrantyEnd(job);
  if (end === undefined) {
    return {
      tone: 'over',
      words:
        'This package was sold without a warranty: a claim is recorded, and counts in no figure.',
    };
  }
  if (madeOn !== '' && madeOn > end) {
    return {
      tone: 'over',
      words: `The warranty ended on ${formatDate(end)}: a claim made after that is recorded, and counts in no figure.`,
    };
  }
  return { tone: 'covered', words: `Under warranty until ${formatDate(end)}.` };
}
