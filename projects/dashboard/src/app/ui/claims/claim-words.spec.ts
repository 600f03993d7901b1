import { claimPlace, countedWords } from './claim-words';

describe('countedWords', () => {
  it.each([
    [{ counted: true, inWarranty: true, decision: 'open' }, 'counts'],
    [{ counted: false, inWarranty: true, decision: 'refused' }, 'does not count: refused'],
    [
      { counted: false, inWarranty: false, decision: 'accepted' },
      "does not count: after the warranty's end",
    ],
    [
      { counted: false, inWarranty: false, decision: 'refused' },
      "does not count: after the warranty's end",
    ],
    [{ counted: false, inWarranty: true, decision: 'open' }, 'does not count: not by this date'],
  ] as const)('of %j, says %s', (claim, words) => {
    expect(countedWords(claim)).toBe(words);
  });
});

describe('claimPlace', () => {
  it('of a claim without a side, names the zone alone', () => {
    expect(claimPlace('tailgate', null)).toBe('tailgate');
  });

  it('of a claim with a side, names both', () => {
    expect(claimPlace('sill_outer', 'left')).toBe('sill, outer, left');
  });
});
