import { riskRow, warrantyAnswer, warrantyReport } from '../../../testing/warranty-report-answers';
import { branchRows } from './branch-rows';
import { claimFreeRows } from './claim-free-rows';
import { cohortRows } from './cohort-rows';
import { leftOut } from './left-out';
import { logRankWords } from './log-rank-words';
import { processRows, stratumRows } from './process-rows';
import { riskRows } from './risk-rows';
import { factorRows, triangleRows } from './triangle-rows';
import { formatDate } from '../../../ui/format';

const NARROW = '\u202f';

describe('claimFreeRows', () => {
  it('of all cars and groups, gives each year and the last month told, with claims so far', () => {
    expect(claimFreeRows(warrantyAnswer()).rows).toEqual([
      ['all', '12', '1,500', '5', `98.8${NARROW}%`, `98.2–99.2${NARROW}%`],
      ['full', '12', '1,100', '2', `99.0${NARROW}%`, `98.4–99.4${NARROW}%`],
      ['underbody only', '12', '400', '2', `98.0${NARROW}%`, `96.5–98.9${NARROW}%`],
    ]);
  });
});

describe('logRankWords', () => {
  it('of two groups, gives the statistic, the p-value and the sums behind it', () => {
    expect(logRankWords(warrantyAnswer())).toBe(
      'Log-rank test: χ² 14.25 on 1 degree of freedom, p < 0.001. Cars with a claim / expected were the groups alike: full 70 / 87, underbody only 48 / 31.',
    );
  });

  it('without a test, says nothing', () => {
    expect(logRankWords(warrantyAnswer({ logRank: null }))).toBe('');
  });
});

describe('cohortRows', () => {
  it('of two half-years, gives whole amounts and a total from the cents', () => {
    const { rows, total } = cohortRows(warrantyAnswer());
    expect(rows[1]).toEqual([
      ...['2024 H2', '1,200', '48', '52', '0.93', '0.68–1.23'],
      ...['4,000', '9,000', '5,000', '1,386'],
    ]);
    expect(total).toEqual([
      ...['all', '2,300', '118', '118', '', ''],
      ...['14,001', '19,001', '5,000', '1,386'],
    ]);
  });
});

describe('branchRows', () => {
  it('with an interval above 1, says so in a word and keeps the order of codes', () => {
    const { rows } = branchRows(warrantyReport());
    expect(rows.map(([name]) => name)).toEqual(['Havnsund', 'Tangmoor', 'Ulvmark']);
    expect(rows.map((row) => row.at(-1))).toEqual(['as expected', 'above', 'as expected']);
    expect(rows[1]).toContain('1.27–2.09');
  });
});

describe('triangleRows', () => {
  it('of a small triangle, is one table to the cent with nothing below the diagonal', () => {
    const [table, ...others] = triangleRows(warrantyAnswer());
    expect(others).toEqual([]);
    expect(table?.columns.map(({ label }) => label)).toEqual(['Finished in', 'own', '+1']);
    expect(table?.rows).toEqual([
      ['2024 H1', '4,444.00', '10,000.40'],
      ['2024 H2', '4,000.20', ''],
    ]);
  });

  it('of one wider than a sheet, goes on in a second table with the cars that are that old', () => {
    const rows = Array.from({ length: 10 }, (_, at) => ({
      cohort: `20${10 + at}-H1`,
      cumulativeCents: Array.from({ length: 10 - at }, () => 100),
    }));
    const tables = triangleRows(warrantyAnswer({ triangle: { rows, factors: [] } }));
    expect(tables.map((table) => table.rows.length)).toEqual([10, 2]);
    expect(tables[1]?.columns.map(({ label }) => label)).toEqual(['Finished in', '+8', '+9']);
    expect(tables[1]?.rows[1]).toEqual(['2011 H1', '1.00', '']);
  });
});

describe('factorRows', () => {
  it('of one factor, gives both sums, their ratio and no variance where there is none', () => {
    expect(factorRows(warrantyAnswer()).rows).toEqual([
      ['own to +1', '4,444.00', '10,000.40', '2.250293', '–'],
    ]);
  });
});

describe('riskRows', () => {
  it('of a half-year that was not over, says nothing of what is still to come', () => {
    const open = riskRow({ cohort: '2026-H1', outstandingCents: null, standardErrorCents: null });
    const [known, unknown] = riskRows(warrantyReport({ rows: [riskRow(), open] })).rows;
    expect(known?.slice(-2)).toEqual(['404', '392']);
    expect(unknown?.slice(-2)).toEqual(['–', '–']);
  });

  it('of any row, has a cell for each column', () => {
    const { columns, rows } = riskRows(warrantyReport());
    for (const row of rows) expect(row).toHaveLength(columns.length);
  });
});

describe('processRows', () => {
  it('of a check and of thin product, gives the cars behind it and the pooled ratio', () => {
    const { rows } = processRows(warrantyAnswer());
    expect(rows[0]).toEqual([
      ...['cavities dry before product', '40', '6', '300', '27', '2', '1.62', '1.10–2.39'],
    ]);
    expect(rows[1]?.slice(-2)).toEqual(['–', '–']);
    expect(rows[2]?.[0]).toBe('under 70 % of the product norm');
  });

  it('age band by age band, gives what the pooled ratio is made of', () => {
    expect(stratumRows(warrantyAnswer()).rows[0]).toEqual([
      ...['cavities dry before product', '5–9', '40', '6', '300', '27'],
    ]);
  });
});

describe('leftOut', () => {
  it('of a report, counts everything that stands outside its figures', () => {
    const lines = leftOut(warrantyReport()).join(' ');
    expect(lines).toContain('150 cars sold without a warranty.');
    expect(lines).toContain('12 claims refused');
    expect(lines).toContain(
      `€430.50 paid after ${formatDate('2025-12-31')}, up to ${formatDate('2026-02-01')}`,
    );
  });
});
