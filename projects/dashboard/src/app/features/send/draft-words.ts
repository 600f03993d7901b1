import type { DeviceDraft } from '../../core/drafts/device-draft';
import { formatCounted } from '../../ui/format';
import { refusalSentence } from './refusal-sentence';
import { carWords } from './review-words';
import { SEND_STEPS, STEP_NAMES } from './send-steps';

/** Where a job on this device stands, in words, and what to do about it. */
export interface DraftWords {
  readonly title: string;
  readonly state: string;
  /** `tide` goes well, `trouble` needs somebody, `quiet` waits for nobody. */
  readonly tone: 'tide' | 'trouble' | 'quiet';
  /** What opening it is called. */
  readonly act: string;
}

/** A draft as the list tells it. */
export function draftWords(draft: DeviceDraft): DraftWords {
  const car = carWords(draft.content);
  const title = [car || 'A car not named yet', draft.jobRef ? `job ${draft.jobRef}` : '']
    .filter(Boolean)
    .join(', ');
  return { title, ...stateWords(draft) };
}

function stateWords(draft: DeviceDraft): Omit<DraftWords, 'title'> {
  const photos = draft.photos.filter(({ state }) => state === 'here').length;
  const why = draft.photos.find(({ problem }) => problem !== undefined)?.problem;
  const refused = draft.photos.filter(({ state }) => state === 'refused').length;
  // A job sent and then corrected here stands in the list twice.
  const correction = draft.corrects === undefined ? '' : 'a correction, ';
  switch (draft.state) {
    case 'waiting':
      return { state: `${correction}waiting to be sent`, tone: 'tide', act: 'Change it' };
    case 'sending':
      return { state: `${correction}being sent`, tone: 'tide', act: 'Look at it' };
    case 'refused':
      return {
        state: `refused: ${refusalSentence(draft.problem?.sentence ?? 'the server did not take it.')}`,
        tone: 'trouble',
        act: 'Mend it',
      };
    case 'sent':
      return {
        state: [
          `${correction}sent`,
          photoWords(photos, 'still to go'),
          photoWords(refused, `refused: ${why ?? 'it cannot be read'}`),
        ]
          .filter(Boolean)
          .join(', '),
        tone: refused > 0 ? 'trouble' : 'tide',
        act: 'Look at it',
      };
    default: {
      const step = STEP_NAMES[SEND_STEPS[draft.step] ?? 'car'];
      // What is written after it was kept stays here until it is kept again.
      const kept = draft.keptAs === undefined ? '' : '; colleagues see what was last kept';
      return { state: `${correction}being written: ${step}${kept}`, tone: 'quiet', act: 'Go on' };
    }
  }
}

/** Whether photos of it were refused for good. */
export function hasRefusedPhotos({ photos }: DeviceDraft): boolean {
  return photos.some(({ state }) => state === 'refused');
}

function photoWords(count: number, words: string): string {
  return count === 0 ? '' : `${formatCounted(count, 'photo', 'photos')} ${words}`;
}
