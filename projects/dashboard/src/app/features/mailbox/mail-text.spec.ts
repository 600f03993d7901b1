import { mailPieces } from './mail-text';

const HERE = 'https://underseam.test';

describe('mailPieces', () => {
  it('of a link into this product gives the path to follow', () => {
    const link = `${HERE}/welcome?token=abc&purpose=invitation`;
    expect(mailPieces(`Open\n${link}\nsoon.`, HERE)).toEqual([
      { text: 'Open\n', path: undefined },
      { text: link, path: '/welcome?token=abc&purpose=invitation' },
      { text: '\nsoon.', path: undefined },
    ]);
  });

  it('of an address elsewhere leaves it text', () => {
    expect(mailPieces('see https://elsewhere.test/x', HERE).every((piece) => !piece.path)).toBe(
      true,
    );
  });
});
