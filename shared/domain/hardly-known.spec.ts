import { hardlyKnownWords } from './hardly-known';

const old = { cohort: '2024-H1', latestCents: 5000, outstandingCents: 100, standardErrorCents: 20 };
const young = { cohort: '2025-H2', latestCents: 7, outstandingCents: 900, standardErrorCents: 600 };
const said = (outstandingCents: number, standardErrorCents: number | null) =>
  hardlyKnownWords(
    { outstandingCents, standardErrorCents },
    [old, young],
    (cents) => `${cents} ct`,
  );

describe('hardlyKnownWords', () => {
  it('given an interval wider than its sum, names the half-year with the widest and what is paid of it', () => {
    expect(said(1175, 600)).toBe(
      'It can hardly be told yet, most of all for cars finished in 2025 H2: of what they will cost only 7 ct is paid.',
    );
  });

  it('given an interval as wide as its sum at most, says nothing', () => {
    expect(said(1176, 600)).toBeUndefined();
  });

  it('given no error at all, says nothing', () => {
    expect(said(1000, null)).toBeUndefined();
  });
});
