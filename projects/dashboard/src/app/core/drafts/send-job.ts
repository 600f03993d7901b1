import { firstValueFrom, timeout } from 'rxjs';
import type * as z from 'zod';
import { getJob, putJob, type JobContent } from '#shared/contracts/jobs';
import type { Api } from '../api/api';
import { describeProblem, type Problem } from '../api/problem';
import type { QueuedJob } from './queued-job';
import { isSameJob } from './same-job';

/** How a try to send something ended. */
export type Sent =
  | { readonly kind: 'accepted'; readonly etag: string | undefined }
  | { readonly kind: 'refused'; readonly problem: Problem }
  /** Not now: no answer, a busy or broken server, or nobody signed in. */
  | { readonly kind: 'later'; readonly problem: Problem };

/** After this a call counts as not answered, ms. */
const PATIENCE = 45_000;

/** Sends a job once more, with the same body as every time before, and tells how that ended. */
export async function sendJob(api: Api, job: QueuedJob): Promise<Sent> {
  return (await arrivedElsewhere(api, job)) ?? (await put(api, job, job.corrects));
}

/** A job given another reference after an unanswered try may be there under the first one: then it is not sent a second time. */
async function arrivedElsewhere(api: Api, job: QueuedJob): Promise<Sent | undefined> {
  for (const { branch, jobRef, body } of job.perhapsThere) {
    if (branch === job.branch && jobRef === job.jobRef) continue;
    try {
      const held = await firstValueFrom(
        api.call(getJob, { params: { branch, jobRef } }).pipe(timeout(PATIENCE)),
      );
      if (isSameJob(JSON.parse(body) as JobContent, held.body)) return elsewhere(jobRef);
    } catch (error) {
      const problem = describeProblem(error);
      if (isForLater(problem)) return { kind: 'later', problem };
    }
  }
  return undefined;
}

function elsewhere(jobRef: string): Sent {
  return {
    kind: 'refused',
    problem: {
      status: 409,
      sentence: `This job has arrived after all, as ${jobRef}, the reference it was sent under first. Open ${jobRef} under Jobs to correct it or have it voided; nothing was sent twice.`,
      fields: [{ path: '/jobRef', message: `the job is there as ${jobRef}` }],
    },
  };
}

async function put(api: Api, job: QueuedJob, corrects: string | undefined): Promise<Sent> {
  try {
    const { body, etag } = await firstValueFrom(
      api
        .call(putJob, {
          params: { branch: job.branch, jobRef: job.jobRef },
          query: { via: 'form' },
          body: JSON.parse(job.body) as z.input<typeof putJob.body>,
          headers: corrects === undefined ? { 'If-None-Match': '*' } : { 'If-Match': corrects },
        })
        .pipe(timeout(PATIENCE)),
    );
    return body.voided ? VOIDED : { kind: 'accepted', etag };
  } catch (error) {
    const problem = describeProblem(error);
    if (problem.status === 412) return afterConflict(api, job, corrects, problem);
    return { kind: isForLater(problem) ? 'later' : 'refused', problem };
  }
}

/**
 * Somebody was first with this reference or revision. If what the server holds is what was sent from here, that somebody was
 * this device, whose answer was lost: now, and it is sent; or at an earlier try before it was written on, and this is a
 * correction of it.
 */
async function afterConflict(
  api: Api,
  job: QueuedJob,
  corrects: string | undefined,
  conflict: Problem,
): Promise<Sent> {
  const { branch, jobRef } = job;
  try {
    const held = await firstValueFrom(
      api.call(getJob, { params: { branch, jobRef } }).pipe(timeout(PATIENCE)),
    );
    const isHeld = (body: string): boolean => isSameJob(JSON.parse(body) as JobContent, held.body);
    if (isHeld(job.body)) return { kind: 'accepted', etag: held.etag };
    const earlier = job.perhapsThere.some(
      (one) => one.branch === branch && one.jobRef === jobRef && isHeld(one.body),
    );
    if (earlier && held.etag !== corrects) return await put(api, job, held.etag);
    return { kind: 'refused', problem: conflict };
  } catch (error) {
    const problem = describeProblem(error);
    return isForLater(problem)
      ? { kind: 'later', problem }
      : { kind: 'refused', problem: conflict };
  }
}

/** Whether the same call may well be taken another time. */
export function isForLater({ status }: Problem): boolean {
  return status === 0 || status >= 500 || [401, 408, 425, 429].includes(status);
}

const VOIDED: Sent = {
  kind: 'refused',
  problem: {
    status: 409,
    sentence:
      'A job of this reference was voided, and sending it again does not bring it back. A site manager can restore it; a new job needs a reference of its own.',
    fields: [{ path: '/jobRef', message: 'belongs to a job that was voided' }],
  },
};
