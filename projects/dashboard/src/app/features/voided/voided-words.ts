import type { voidedJob } from '#shared/contracts/corrections';
import type * as z from 'zod';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatInstant, formatShortDate } from '../../ui/format';

export type VoidedJob = z.output<typeof voidedJob>;

/** How many jobs stand void, and what that means. */
export function voidedSentence(jobs: number, more: boolean): readonly AnswerPart[] {
  if (jobs === 0) return ['No job stands void here.'];
  const count = `${formatCount(jobs)}${more ? ' and more' : ''}`;
  const one = jobs === 1 && !more;
  return [
    { figure: count },
    one ? ' job stands void: it is in no figure' : ' jobs stand void: they are in no figure',
    one ? ' and stays in the record.' : ' and stay in the record.',
  ];
}

/** What the job was: car, package, when it was finished. */
export function whatWords(job: VoidedJob, packageName: string): string {
  const car = `${job.make} ${job.model} ${job.firstRegistered.slice(0, 4)}`;
  return `${car}, ${packageName}, finished ${formatShortDate(job.completedOn)}`;
}

/** When it was voided and by whom. */
export function voidingWords(job: VoidedJob): string {
  const when = `Voided ${formatInstant(job.voidedAt)}`;
  return job.voidedBy === null
    ? `${when}; the trail does not say by whom`
    : `${when} by ${job.voidedBy}`;
}
