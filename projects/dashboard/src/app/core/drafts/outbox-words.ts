import type { OutboxState } from './outbox';

/** What is to be told of the outbox: a line of words, and whether it wants doing something about. */
export interface OutboxWords {
  readonly words: readonly string[];
  readonly tone: 'calm' | 'attention';
}

/** Says in words where jobs on this device stand: what is kept, what waits and for what. */
export function outboxWords(
  state: OutboxState,
  editing: number,
  device: 'phone' | 'device',
): OutboxWords {
  const { waiting, refused, photosWaiting, sending, line, signedOut } = state;
  const words: string[] = [];
  if (refused > 0) words.push(`${refused} refused: open to mend`);
  if (waiting > 0) words.push(`${waiting} waiting to be sent`);
  if (photosWaiting > 0) {
    words.push(`${photosWaiting} ${photosWaiting === 1 ? 'photo' : 'photos'} waiting to be sent`);
  }
  if (waiting + refused + editing > 0) words.unshift(`Kept on this ${device}`);
  if (line === 'down') words.push('no line');
  else if (signedOut && waiting + photosWaiting > 0) words.push('sign in to send');
  else if (sending) words.push('sending…');
  return { words, tone: refused > 0 || signedOut ? 'attention' : 'calm' };
}
