import { formatDate } from '../../ui/format';
import { coverWords } from './claim-head';

const JOB = { completedOn: '2024-02-29', warrantyMonths: 12 };

describe('coverWords', () => {
  it('given a claim on the last day, is covered (rule 16)', () => {
    expect(coverWords(JOB, '2025-02-28')).toEqual({
      tone: 'covered',
      words: `Under warranty until ${formatDate('2025-02-28')}.`,
    });
  });

  it('given a claim the day after, says that it counts in no figure', () => {
    const said = coverWords(JOB, '2025-03-01');
    expect(said.tone).toBe('over');
    expect(said.words).toContain('counts in no figure');
  });

  it('given a package without a warranty, says so', () => {
    expect(coverWords({ ...JOB, warrantyMonths: 0 }, '2024-03-01').words).toContain(
      'without a warranty',
    );
  });
});
