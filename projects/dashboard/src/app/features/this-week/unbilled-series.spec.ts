import { jobsAnswer, unbilledRow } from '../../testing/week-answers';
import { beyondWords, spentParts } from './unbilled-series';
import type { WeekWords } from './week-words';

const words: WeekWords = {
  currency: 'EUR',
  today: '2026-02-02',
  branchName: () => 'Havnsund',
  packageName: (code) => code,
  productName: (code) => code,
  whose: '',
};
const plain = (text: string): string => text.replaceAll('\u202f', ' ');

describe('beyondWords', () => {
  it('agreed extras and work beyond what was charged: both, with the branch where there are several', () => {
    const row = unbilledRow('1', 19, {
      agreedExtraCents: 9_000,
      agreedExtraMinutes: 60,
      beyondChargedMinutes: 155,
    });
    expect(plain(beyondWords(row, words, false))).toBe(
      'agreed extras €90 for 1 h · 2 h 35 min beyond what was charged',
    );
    expect(plain(beyondWords(row, words, true))).toMatch(/^Havnsund · agreed extras/);
  });

  it('nothing of either: nothing said', () => {
    expect(beyondWords(unbilledRow('1', 3), words, false)).toBe('');
  });
});

describe('spentParts', () => {
  it('a whole list: the sum of its costs and the longest wait', () => {
    const list = jobsAnswer([unbilledRow('1', 19), unbilledRow('2', 3, { costCents: 30_250 })]);
    const { sum, words: said } = spentParts(list, 'EUR');
    expect(sum).toBe('€915');
    expect(said).toBe(
      'spent and outside every margin here until billed. The oldest has waited 19 days.',
    );
  });

  it('one car: it, not the oldest', () => {
    expect(spentParts(jobsAnswer([unbilledRow('1', 1)]), 'EUR').words).toContain(
      'It has waited 1 day.',
    );
  });

  it('a cost not known: said, not summed as if it were 0', () => {
    const list = jobsAnswer([unbilledRow('1', 19), unbilledRow('2', 3, { costCents: null })]);
    expect(spentParts(list, 'EUR').words).toContain('The cost of one is not known.');
  });

  it('a list cut at its page: the sum is of those shown', () => {
    const list = { ...jobsAnswer([unbilledRow('1', 19)]), nextCursor: 'more', jobs: 300 };
    expect(spentParts(list, 'EUR').words).toContain('the 1 that have waited longest');
  });
});
