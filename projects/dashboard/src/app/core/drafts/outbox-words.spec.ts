import type { OutboxState } from './outbox';
import { outboxWords } from './outbox-words';

const REST: OutboxState = {
  waiting: 0,
  refused: 0,
  photosWaiting: 0,
  sending: false,
  line: 'up',
  signedOut: false,
};
const said = (more: Partial<OutboxState>, editing = 0) =>
  outboxWords({ ...REST, ...more }, editing, 'phone').words.join(', ');

describe('outboxWords', () => {
  it.each<[what: string, state: Partial<OutboxState>, editing: number, words: string]>([
    ['a job being written', {}, 1, 'Kept on this phone'],
    ['two that wait', { waiting: 2 }, 0, 'Kept on this phone, 2 waiting to be sent'],
    [
      'one on its way',
      { waiting: 1, sending: true },
      0,
      'Kept on this phone, 1 waiting to be sent, sending…',
    ],
    [
      'no line',
      { waiting: 1, sending: true, line: 'down' },
      0,
      'Kept on this phone, 1 waiting to be sent, no line',
    ],
    ['one refused', { refused: 1 }, 0, 'Kept on this phone, 1 refused: open to mend'],
    ['one photo left', { photosWaiting: 1 }, 0, '1 photo waiting to be sent'],
    [
      'nobody signed in',
      { waiting: 1, signedOut: true },
      0,
      'Kept on this phone, 1 waiting to be sent, sign in to send',
    ],
    ['nothing here and no line', { line: 'down' }, 0, 'no line'],
  ])('given %s, says so', (_what, state, editing, words) => {
    expect(said(state, editing)).toBe(words);
  });

  it('given something that only a person can mend, asks for attention', () => {
    expect(outboxWords({ ...REST, refused: 1 }, 0, 'device').tone).toBe('attention');
    expect(outboxWords({ ...REST, waiting: 1, line: 'down' }, 0, 'device').tone).toBe('calm');
  });
});
