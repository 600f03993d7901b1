import { placesWords, standingWords } from './person-words';

const NAMES = {
  regionName: (code: string) => ({ SO: 'Sound', RI: 'River' })[code] ?? code,
  branchName: (code: string) => ({ HAV: 'Havnsund' })[code] ?? code,
};

describe('placesWords', () => {
  it.each([
    [{ role: 'head_office', regions: [], branches: [] }, 'the whole network'],
    [{ role: 'regional_lead', regions: ['SO', 'RI'], branches: [] }, 'all of Sound and River'],
    [{ role: 'recorder', regions: [], branches: ['HAV'] }, 'Havnsund'],
  ] as const)('%o, sees %s', (person, words) => {
    const { role, regions, branches } = person;
    expect(placesWords({ role, regions: [...regions], branches: [...branches] }, NAMES)).toBe(
      words,
    );
  });
});

describe('standingWords', () => {
  it.each([
    [{ active: true, invited: false }, 'active'],
    [{ active: true, invited: true }, 'invited, not here yet'],
    [{ active: false, invited: true }, 'turned off'],
  ])('%o, is said as %s', (person, words) => {
    expect(standingWords(person)).toBe(words);
  });
});
