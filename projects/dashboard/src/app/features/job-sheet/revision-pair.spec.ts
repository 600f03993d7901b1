import { pairToUrl, revisionPair } from './revision-pair';

describe('revisionPair', () => {
  it('of two revisions there are, either way round, puts the earlier first', () => {
    expect(revisionPair('2-4', 4)).toEqual({ from: 2, to: 4 });
    expect(revisionPair('4-2', 4)).toEqual({ from: 2, to: 4 });
  });

  it.each([undefined, '', '2', '2-2', '0-1', '1-5', '1-x', '-1-2', '1-2-3'])(
    'of %s with four revisions, is none',
    (words) => {
      expect(revisionPair(words, 4)).toBeUndefined();
    },
  );

  it('written to the URL, reads as the same', () => {
    expect(revisionPair(pairToUrl({ from: 1, to: 3 }), 3)).toEqual({ from: 1, to: 3 });
  });
});
