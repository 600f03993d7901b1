import { firstValueFrom, timeout, TimeoutError } from 'rxjs';
import { getClaim, putClaim } from '#shared/contracts/claims';
import type { OutOf } from '#shared/contracts/endpoint';
import type { Api } from '../../core/api/api';
import { describeProblem, type Problem } from '../../core/api/problem';
import type { TriedClaim } from '../../core/drafts/claim-draft';
import { isForLater } from '../../core/drafts/send-job';
import { nextReference } from './claim-reference';
import { isSameClaim } from './same-claim';
import type { ClaimBody } from './typed-claim';

/** A claim to be sent, and what went out before without an answer. */
export interface NewClaim {
  readonly branch: string;
  readonly claimRef: string;
  readonly body: ClaimBody;
  readonly tried: TriedClaim | undefined;
}

/** How sending a claim ended. */
export type SentClaim =
  | { readonly kind: 'recorded'; readonly claimRef: string }
  /** Nothing was written; mend it and send it again. */
  | { readonly kind: 'refused'; readonly problem: Problem }
  /** Not known whether it arrived, or not now. */
  | { readonly kind: 'unanswered'; readonly problem: Problem };

type Recorded = OutOf<typeof putClaim>;

/** After this a call counts as not answered, ms. */
const PATIENCE = 45_000;
/** References of one day looked through for a free one. */
const MOST_TRIES = 200;

/**
 * Records a claim once, however often this is called with what was tried before. A reference that is taken gives way to the next,
 * unless somebody wrote it themselves; one that holds what was sent from here is no conflict but a lost answer. `trying` is told
 * what goes out before it does.
 */
export async function sendClaim(
  api: Api,
  claim: NewClaim,
  trying: (tried: TriedClaim | undefined) => Promise<unknown>,
): Promise<SentClaim> {
  let { claimRef, tried } = claim;
  const body = JSON.stringify(claim.body);
  for (let turn = 0; turn < MOST_TRIES; turn += 1) {
    const before = tried?.claimRef === claimRef ? tried.bodies : [];
    tried = { claimRef, bodies: [...before.filter((one) => one !== body), body] };
    await trying(tried);
    try {
      return { kind: 'recorded', claimRef: await put(api, claim, claimRef) };
    } catch (error) {
      const problem = problemOf(error);
      if (problem.status !== 412 && isForLater(problem)) return { kind: 'unanswered', problem };
      // This one did not arrive; what went out before it may have.
      await trying(before.length > 0 ? { claimRef, bodies: before } : undefined);
      if (problem.status !== 412) return { kind: 'refused', problem };
      const after = await afterConflict(api, claim, claimRef, before);
      if (after) return after;
      const next = nextReference(claimRef);
      if (next === undefined) return taken(claimRef);
      claimRef = next;
    }
  }
  return taken(claimRef);
}

async function put(
  api: Api,
  { branch, body }: NewClaim,
  claimRef: string,
  etag?: string,
): Promise<Recorded['claimRef']> {
  const answer = await firstValueFrom(
    api
      .call(putClaim, {
        params: { branch, claimRef },
        body,
        headers: etag === undefined ? { 'If-None-Match': '*' } : { 'If-Match': etag },
      })
      .pipe(timeout(PATIENCE)),
  );
  return answer.body.claimRef;
}

/** The reference is taken: by this device, whose answer was lost, or by somebody else, and then `undefined`. */
async function afterConflict(
  api: Api,
  claim: NewClaim,
  claimRef: string,
  before: readonly string[],
): Promise<SentClaim | undefined> {
  const { branch, body } = claim;
  try {
    const held = await firstValueFrom(
      api.call(getClaim, { params: { branch, claimRef } }).pipe(timeout(PATIENCE)),
    );
    if (isSameClaim(body, held.body)) return { kind: 'recorded', claimRef };
    const earlier = before.some((one) => isSameClaim(JSON.parse(one) as ClaimBody, held.body));
    if (!earlier) {
      const perhapsOurs = before.length > 0 && held.body.jobRef === body.jobRef;
      return perhapsOurs ? thereAndChanged(claimRef) : undefined;
    }
    // It arrived before it was written on: what was written since is a correction of it.
    return { kind: 'recorded', claimRef: await put(api, claim, claimRef, held.etag) };
  } catch (error) {
    const problem = problemOf(error);
    // Taken by a claim that is not seen, as one whose job is void.
    if (problem.status === 404) return undefined;
    return { kind: isForLater(problem) ? 'unanswered' : 'refused', problem };
  }
}

/** What a call threw, in words; one that took too long was not answered. */
export function problemOf(error: unknown): Problem {
  if (!(error instanceof TimeoutError)) return describeProblem(error);
  return {
    status: 0,
    sentence:
      'No answer from the server. Nothing typed here is lost; try again when the line is back.',
    fields: [],
  };
}

function thereAndChanged(claimRef: string): SentClaim {
  return {
    kind: 'refused',
    problem: {
      status: 409,
      sentence: `Claim ${claimRef} on this job has arrived after all and was changed since. Open it on the job sheet to correct it; nothing was sent twice.`,
      fields: [],
    },
  };
}

function taken(claimRef: string): SentClaim {
  return {
    kind: 'refused',
    problem: {
      status: 412,
      sentence: `There already is a claim ${claimRef} at this branch. Nothing was written: give this one a reference of its own.`,
      fields: [{ path: '/claimRef', message: 'Belongs to another claim.' }],
    },
  };
}
