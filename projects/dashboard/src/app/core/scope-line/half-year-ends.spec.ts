import { halfYearEnds } from './half-year-ends';

describe('halfYearEnds', () => {
  it('in February, begins with the December before', () => {
    expect(halfYearEnds('2026-02-02', 4)).toEqual([
      '2025-12-31',
      '2025-06-30',
      '2024-12-31',
      '2024-06-30',
    ]);
  });

  it('on the last day of a half-year, begins with that day', () => {
    expect(halfYearEnds('2026-06-30', 1)).toEqual(['2026-06-30']);
  });
});
