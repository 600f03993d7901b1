import { firstValueFrom, timeout } from 'rxjs';
import { listPhotos, putPhoto, removePhoto } from '#shared/contracts/photos';
import type { Api } from '../api/api';
import { describeProblem, type Problem } from '../api/problem';
import type { DeviceDraft, DevicePhoto } from './device-draft';
import type { Drafts } from './drafts';
import { isForLater } from './send-job';

/** Ten megabytes at the pace of an old phone's line, ms. */
const PATIENCE = 180_000;

/**
 * Sends the photos of a job that the server has, one after another, and takes off those that were taken off here. Sending one
 * twice keeps one. A photo refused is said at the photo; the others go on. Gives what stands in the way of the rest for now.
 */
export async function sendPhotos(
  api: Api,
  drafts: Drafts,
  draft: DeviceDraft,
): Promise<Problem | undefined> {
  const params = { branch: draft.branch, jobRef: draft.jobRef };
  for (const photo of draft.photosGone ?? []) {
    const problem = await problemOf(
      api.call(removePhoto, { params: { ...params, photo } }).pipe(timeout(PATIENCE)),
    );
    if (problem && isForLater(problem)) return problem;
    await drafts.mark(draft.id, ({ photosGone = [] }) => ({
      photosGone: photosGone.filter((one) => one !== photo),
    }));
  }
  for (const photo of draft.photos.filter(({ state }) => state === 'here')) {
    const problem = await sendOne(api, drafts, draft, photo);
    if (problem && isForLater(problem)) return problem;
    await drafts.mark(draft.id, ({ photos }) => ({
      photos: photos.map((one) => (one.id === photo.id ? { ...one, ...toldOf(problem) } : one)),
    }));
    // The device's room is short; what the server has need not stay here once the job is done with.
    if (!problem && draft.state === 'sent') await drafts.dropBytes(draft.id, photo.id);
  }
  return undefined;
}

/** Photos sent while the job was under way, which went if somebody dropped it there since: they are sent again. */
export async function photosToRepeat(
  api: Api,
  { branch, jobRef, photos }: DeviceDraft,
): Promise<readonly string[]> {
  const sent = photos.filter(({ state }) => state === 'sent').map(({ id }) => id);
  if (sent.length === 0) return [];
  const held = await firstValueFrom(
    api.call(listPhotos, { params: { branch, jobRef } }).pipe(timeout(PATIENCE)),
  ).catch(() => undefined);
  const there = new Set(held?.body.items.map(({ photo }) => photo) ?? sent);
  return sent.filter((id) => !there.has(id));
}

async function sendOne(
  api: Api,
  drafts: Drafts,
  { id, branch, jobRef }: DeviceDraft,
  { id: photo, finding }: DevicePhoto,
): Promise<Problem | undefined> {
  const body = await drafts.photo(id, photo);
  if (!body) return GONE;
  return problemOf(
    api
      .call(putPhoto, {
        params: { branch, jobRef, photo },
        query: finding === null ? {} : { finding },
        body,
      })
      .pipe(timeout(PATIENCE)),
  );
}

function toldOf(problem: Problem | undefined): Pick<DevicePhoto, 'state' | 'problem'> {
  return problem ? { state: 'refused', problem: problem.sentence } : { state: 'sent' };
}

async function problemOf(call: Parameters<typeof firstValueFrom>[0]): Promise<Problem | undefined> {
  try {
    await firstValueFrom(call);
    return undefined;
  } catch (error) {
    return describeProblem(error);
  }
}

const GONE: Problem = {
  status: 410,
  sentence: 'This photo is no longer on this device. Take it again.',
  fields: [],
};
