import type { DeviceDraft } from './device-draft';
import type { Unsent } from './unsent-here';

/** What of some drafts the server does not have yet. */
export function unsentIn(drafts: readonly DeviceDraft[]): Unsent {
  const waiting = drafts.filter(
    (draft) =>
      ['waiting', 'sending', 'refused'].includes(draft.state) ||
      (draft.state === 'sent' && photosLeft(draft) > 0),
  );
  return {
    editing: drafts.filter(({ state }) => state === 'editing').length,
    waiting: waiting.length,
  };
}

/** Photos of a draft that are still to be sent, or taken off, once its job is there. */
export function photosLeft({ photos, photosGone = [] }: DeviceDraft): number {
  return photos.filter(({ state }) => state === 'here').length + photosGone.length;
}

/** Whether a sent job may leave the device: the day after, when nothing of it is left here and nothing was refused. */
export function isOver(draft: DeviceDraft, now: Date): boolean {
  if (draft.state !== 'sent' || draft.sentAt === undefined) return false;
  if (draft.photos.some(({ state }) => state !== 'sent') || photosLeft(draft) > 0) return false;
  return new Date(draft.sentAt).toDateString() !== now.toDateString();
}
