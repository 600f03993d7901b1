import { filtersOf, filterWords, halfYearsTo, sortOf, type WrittenFilters } from './claim-filters';

const NONE: WrittenFilters = {
  q: undefined,
  decision: undefined,
  waiting: undefined,
  cause: undefined,
  zone: undefined,
  ageBand: undefined,
  cohort: undefined,
  counted: undefined,
  jobRef: undefined,
};
const say = (written: Partial<WrittenFilters>) => filterWords(filtersOf({ ...NONE, ...written }));

describe('filters of claims', () => {
  it('given none, say nothing', () => {
    expect(say({})).toEqual([]);
  });

  it('given words a URL should not hold, are no filters', () => {
    const wrong = { decision: 'maybe', waiting: 'yes', cohort: '2024', ageBand: '5', zone: 'roof' };
    expect(say({ ...wrong, cause: 'bad luck', counted: '1' })).toEqual([]);
    expect(sortOf('price')).toBe('made');
  });

  it('given all, say each in words', () => {
    expect(
      say({
        q: 'Velder',
        decision: 'open',
        waiting: 'true',
        cause: 'thin_coverage',
        zone: 'sill_outer',
        ageBand: '10-14',
        cohort: '2024-H2',
        counted: 'false',
        jobRef: '0417',
      }),
    ).toEqual([
      'on job 0417',
      'matching “Velder”',
      'waiting for head office',
      'still open',
      'for “too thin a coat”',
      'at the outer sill',
      'on cars 10–14 years old',
      'on cars finished in the second half of 2024',
      'that do not count',
    ]);
  });
});

describe('halfYearsTo', () => {
  it.each([
    ['2026-02-02', ['2026-H1', '2025-H2', '2025-H1']],
    ['2025-07-01', ['2025-H2', '2025-H1', '2024-H2']],
    ['2025-06-30', ['2025-H1', '2024-H2', '2024-H1']],
  ])('to %s, gives the newest first', (today, halves) => {
    expect(halfYearsTo(today, 3)).toEqual(halves);
  });
});
