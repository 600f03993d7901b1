import { breaksOfJob, type JobWorld } from '#shared/domain/job-rules';
import { jobParams } from '#shared/contracts/jobs';
import { joined, problemsOf } from '#shared/contracts/read-problems';
import type { FieldProblem } from '#shared/contracts/fields';
import { jobOfDraft } from '../../core/drafts/job-of-draft';
import { type DraftDocument, keyedPath, valueAt } from './draft-document';

/**
 * What is still missing or cannot be so, by the same rules as on the server, so that a phone without a line learns it at once.
 * Loaded when it is needed: the shapes of a job are the heaviest part of the form.
 */
export function checkDraft(
  { jobRef, ...draft }: DraftDocument,
  world: JobWorld,
  now: Date,
): readonly FieldProblem[] {
  const ref = (jobRef ?? '').trim();
  const named = jobParams.shape.jobRef.safeParse(ref);
  const made = jobOfDraft(draft, now);
  // Where the shape is right the rules look at what would be sent, timers stopped; else at what there is.
  const body = 'job' in made ? made.job : draft;
  return joined(
    named.success ? [] : problemsOf(named.error, '/jobRef').slice(0, 1),
    'missing' in made ? made.missing : [],
    breaksOfJob(body, world),
  ).map(({ path, message }) => {
    const keyed = keyedPath(draft, path);
    // Of a field left empty its choices or its length say nothing: it is missing.
    const missing = keyed === '/jobRef' ? ref === '' : isShape(path) && isEmpty(draft, keyed);
    return { path: keyed, message: missing ? 'is required' : message };
  });

  function isShape(path: string): boolean {
    return 'missing' in made && made.missing.some((one) => one.path === path);
  }
}

function isEmpty(draft: DraftDocument, path: string): boolean {
  return [undefined, ''].includes(valueAt(draft, path) as string | undefined);
}
