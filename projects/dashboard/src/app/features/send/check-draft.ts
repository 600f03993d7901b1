import { breaksOfJob, type JobWorld } from '#shared/domain/job-rules';
import { jobParams } from '#shared/contracts/jobs';
import { joined, problemsOf } from '#shared/contracts/read-problems';
import type { FieldProblem } from '#shared/contracts/fields';
import { jobOfDraft } from '../../core/drafts/job-of-draft';
import { type DraftDocument, keyedPath } from './draft-document';

/**
 * What is still missing or cannot be so, by the same rules as on the server, so that a phone without a line learns it at once.
 * Loaded when it is needed: the shapes of a job are the heaviest part of the form.
 */
export function checkDraft(
  { jobRef, ...draft }: DraftDocument,
  world: JobWorld,
  now: Date,
): readonly FieldProblem[] {
  const named = jobParams.shape.jobRef.safeParse((jobRef ?? '').trim());
  const made = jobOfDraft(draft, now);
  // Where the shape is right the rules look at what would be sent, timers stopped; else at what there is.
  const body = 'job' in made ? made.job : draft;
  return joined(
    named.success ? [] : problemsOf(named.error, '/jobRef').slice(0, 1),
    'missing' in made ? made.missing : [],
    breaksOfJob(body, world),
  ).map(({ path, message }) => ({ path: keyedPath(draft, path), message }));
}
