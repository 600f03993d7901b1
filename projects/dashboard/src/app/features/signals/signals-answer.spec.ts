import { dangerSignal, signalList, signalOf } from '../../testing/signal-answers';
import { formatDate } from '../../ui/format';
import { answerSignals, lookedWords } from './signals-answer';

const ALL = { state: undefined, kind: undefined };
const said = (parts: readonly unknown[]): string =>
  parts
    .map((part) => (typeof part === 'string' ? part : Object.values(part as object)[0]))
    .join('')
    .replaceAll('\u202f', ' ');
const answer = (...args: Parameters<typeof answerSignals>): string =>
  said(answerSignals(...args).sentence);

describe('answerSignals', () => {
  it('open ones, one of them a danger, says how many, where, and that one can hurt somebody', () => {
    const list = signalList([dangerSignal(1), signalOf(2), signalOf(3), signalOf(4)]);
    expect(answer(list, ALL, 'your 6 branches', '2026-02-02')).toBe(
      '4 signals are open in your 6 branches; one can hurt somebody.',
    );
  });

  it('a single one that is a danger, says so of it', () => {
    expect(answer(signalList([dangerSignal(1)]), ALL, 'Havnsund', '2026-02-02')).toBe(
      '1 signal is open in Havnsund; it can hurt somebody.',
    );
  });

  it('a danger that is over, is none any more', () => {
    const list = signalList([dangerSignal(1, { state: 'over', overOn: '2026-01-20' })]);
    expect(answer(list, { state: 'over', kind: undefined }, 'Havnsund', '2026-02-02')).toBe(
      '1 signal is over in Havnsund.',
    );
  });

  it('some of them seen, says how many', () => {
    const list = signalList([signalOf(1), signalOf(2, { state: 'acknowledged' })]);
    expect(answer(list, ALL, 'Havnsund', '2026-02-02')).toContain(
      '2 signals are not over, 1 of them seen, in Havnsund',
    );
  });

  it('none, says that nothing stands out and when was looked', () => {
    const list = signalList([]);
    expect(answer(list, ALL, 'Havnsund', '2026-02-02')).toBe('Nothing stands out in Havnsund.');
    expect(said(answerSignals(list, ALL, 'Havnsund', '2026-02-02').second)).toBe(
      `Looked at last night, ${formatDate('2026-02-02')}.`,
    );
  });

  it('before the first look, does not say that nothing stands out', () => {
    const list = signalList([], { lookedOn: null });
    expect(answer(list, ALL, 'Havnsund', '2026-02-02')).not.toContain('Nothing stands out');
  });
});

describe('lookedWords', () => {
  it('a night that was missed, is said', () => {
    expect(lookedWords('2026-01-30', '2026-02-02')).toContain('3 days ago');
  });
});
