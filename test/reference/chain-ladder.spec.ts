import { chainLadder, originError, type ChainLadder } from '#shared/stats/chain-ladder';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

const cases = checkCases<{ cumulative_rows: number[][] }>('chain_ladder_mack');

describe('chainLadder', () => {
  it.each(cases)('given %s, agrees', (_title, check) => {
    const { factors, origins, total } = ladderOf(check.input.cumulative_rows);
    const development = factors.map((one) => one.factor);
    const reserves = origins.map((origin) => origin.outstanding);
    expectFigures(check, {
      development_factors: development,
      f: development,
      sigma2: factors.map((one) => one.sigmaSquared ?? null),
      sigma: factors.map((one) => Math.sqrt(one.sigmaSquared ?? Number.NaN)),
      latest: origins.map((origin) => origin.latest),
      ultimate: origins.map((origin) => origin.ultimate),
      reserve: reserves,
      reserve_thousands: reserves.map((reserve) => reserve / 1000),
      se: origins.map((origin) => origin.standardError ?? null),
      total_reserve: total.outstanding,
      total_se: total.standardError,
    });
  });

  it.each(cases)('given one origin of %s, agrees', (_title, check) => {
    const rows = check.input.cumulative_rows;
    const ladder = ladderOf(rows);
    expectFigures(
      { ...check, expected: { se: check.expected['se'] ?? [] }, published: {} },
      {
        se: rows.map((row) => originError(row.at(-1) ?? 0, row.length - 1, ladder) ?? null),
      },
    );
  });
});

function ladderOf(rows: number[][]): ChainLadder {
  const ladder = chainLadder(rows);
  if (!ladder) throw new Error('no ladder');
  return ladder;
}
