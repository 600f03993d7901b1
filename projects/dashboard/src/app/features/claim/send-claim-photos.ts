import { firstValueFrom, timeout } from 'rxjs';
import { putClaimPhoto } from '#shared/contracts/photos';
import type { Api } from '../../core/api/api';
import type { Problem } from '../../core/api/problem';
import type { ClaimDraft } from '../../core/drafts/claim-draft';
import type { ClaimDrafts } from '../../core/drafts/claim-drafts';
import { isForLater } from '../../core/drafts/send-job';
import { problemOf } from './send-claim';

/** Ten megabytes at the pace of an old phone's line, ms. */
const PATIENCE = 180_000;

const GONE = 'This photo is no longer on this device. Take it again.';

/**
 * Sends the photos of a claim that the server has, one after another; sending one twice keeps one. A photo refused is said at the
 * photo and the others go on. Gives what stands in the way of the rest for now. `shown` is told of each change.
 */
export async function sendClaimPhotos(
  api: Api,
  drafts: ClaimDrafts,
  draft: ClaimDraft,
  shown: (draft: ClaimDraft | undefined) => void,
): Promise<Problem | undefined> {
  const { branch, sentAs, photos } = draft;
  if (sentAs === undefined) return undefined;
  for (const { id } of photos.filter(({ state }) => state !== 'sent')) {
    const body = await drafts.photo(draft, id);
    if (!body) {
      shown(await drafts.markPhoto(draft, id, { state: 'refused', problem: GONE }));
      continue;
    }
    try {
      await firstValueFrom(
        api
          .call(putClaimPhoto, { params: { branch, claimRef: sentAs, photo: id }, body })
          .pipe(timeout(PATIENCE)),
      );
      shown(await drafts.markPhoto(draft, id, { state: 'sent' }));
    } catch (error) {
      const problem = problemOf(error);
      if (isForLater(problem)) return problem;
      shown(await drafts.markPhoto(draft, id, { state: 'refused', problem: problem.sentence }));
    }
  }
  return undefined;
}
