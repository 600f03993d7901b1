import { completedWords, kindsWords, periodWords, placesWords } from './scope-words';

const OWN = { regions: ['Outer Coast'], branches: ['Havnsund', 'Tangvarp'] };

describe('placesWords', () => {
  it('with chosen branches names up to three and counts more', () => {
    const none = { regions: [], branches: [] };
    expect(placesWords({ ...none, branches: ['A', 'B'] }, OWN, 'head_office')).toBe('A and B');
    expect(placesWords({ ...none, branches: ['A', 'B', 'C', 'D'] }, OWN, 'head_office')).toBe(
      '4 branches',
    );
  });

  it('with nothing chosen says what the role sees', () => {
    const none = { regions: [], branches: [] };
    expect(placesWords(none, OWN, 'head_office')).toBe('Whole network');
    expect(placesWords(none, OWN, 'regional_lead')).toBe('Outer Coast');
    expect(placesWords(none, OWN, 'site_manager')).toBe('Havnsund and Tangvarp');
  });
});

describe('kindsWords', () => {
  it('with none chosen says all of them', () => {
    expect(kindsWords([], 'packages')).toBe('all packages');
    expect(kindsWords(['full'], 'packages')).toBe('full');
  });
});

describe('completedWords', () => {
  it('of all cars says since when there are any, once that is known', () => {
    expect(completedWords(undefined, undefined)).toBe('all cars finished');
    expect(completedWords(undefined, '2022-07-04')).toBe('cars finished since July 2022');
  });

  it('of chosen weeks says them', () => {
    expect(completedWords({ kind: 'last', weeks: 13 }, '2022-07-04')).toBe(
      'cars finished in the last 13 weeks',
    );
  });
});

describe('periodWords', () => {
  it('of weeks and of dates reads as one says it', () => {
    expect(periodWords({ kind: 'last', weeks: 26 })).toBe('last 26 weeks');
    // Day first or month first, as the reader's English has it.
    expect(periodWords({ kind: 'dates', from: '2026-01-01', to: '2026-03-05' })).toMatch(
      /^(1 Jan\s–\s5 Mar 2026|Jan 1\s–\sMar 5, 2026)$/,
    );
  });
});
