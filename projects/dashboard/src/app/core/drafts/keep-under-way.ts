import { firstValueFrom, timeout } from 'rxjs';
import { getUnderWay, keepUnderWay, type JobUnderWay } from '#shared/contracts/under-way';
import type { Answer, Api } from '../api/api';
import { describeProblem, ProblemError } from '../api/problem';
import type { DeviceDraft } from './device-draft';

/** A person waits for this one, so it is not given long, ms. */
const PATIENCE = 20_000;

/**
 * Keeps a draft on the server for the colleagues of the branch and gives the ETag it is kept under. Where somebody changed it
 * there meanwhile, that is thrown, unless what is there is this very draft and only the answer was lost.
 */
export async function keepUnderWayOf(
  api: Api,
  { branch, jobRef, content, keptAs }: DeviceDraft,
): Promise<string | undefined> {
  const params = { branch, jobRef };
  try {
    const kept = await firstValueFrom(
      api
        .call(keepUnderWay, {
          params,
          body: content,
          headers: keptAs === undefined ? { 'If-None-Match': '*' } : { 'If-Match': keptAs },
        })
        .pipe(timeout(PATIENCE)),
    );
    return kept.etag;
  } catch (error) {
    const problem = describeProblem(error);
    if (problem.status === 412) {
      const held = await there(api, params);
      if (held && textOf(held.body.content) === textOf(content)) return held.etag;
    }
    throw new ProblemError(problem);
  }
}

async function there(
  api: Api,
  params: { branch: string; jobRef: string },
): Promise<Answer<JobUnderWay> | undefined> {
  return firstValueFrom(api.call(getUnderWay, { params }).pipe(timeout(PATIENCE))).catch(
    () => undefined,
  );
}

/** The same text for the same content, whatever the order of its fields. */
function textOf(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'object' && part !== null && !Array.isArray(part)
      ? Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : 1)))
      : part,
  );
}
