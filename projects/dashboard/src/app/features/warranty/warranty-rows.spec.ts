import {
  branchWarrantyAnswer,
  noWarranty,
  processRisk,
  warrantyAnswer,
} from '../../testing/warranty-answers';
import { branchRows } from './branch-rows';
import { cohortTable } from './cohort-rows';
import { curvesPicture, usefulGroupings } from './curves-picture';
import { expectedTable } from './expected-rows';
import { leftOut } from './left-out';
import { zoneTable } from './placed-rows';
import { processRows } from './process-rows';
import { strataRows } from './strata-rows';
import { triangleTable } from './triangle-rows';
import { warrantyLinks } from './warranty-links';

const words = {
  currency: 'EUR',
  branchName: (code: string) => code,
  regionName: (code: string) => code,
  packageWord: (code: string) => code,
};
const links = warrantyLinks({ asOf: '2026-02-01' }, { from: '2024-01-08', to: '2026-02-02' });

describe('warrantyLinks', () => {
  it('to cars: within the days of the answer, without the day as of which', () => {
    expect(links.cars({ branch: 'HAV' })).toEqual({
      commands: ['/jobs'],
      query: { from: '2024-01-08', to: '2026-02-02', branch: 'HAV' },
    });
  });

  it('to claims: those that count, unless all are meant', () => {
    expect(links.claims({ zone: 'floor' }).query).toEqual({
      asOf: '2026-02-01',
      counted: 'true',
      zone: 'floor',
    });
    expect(links.claims({ counted: undefined }).query!['counted']).toBeUndefined();
  });
});

describe('cohortTable', () => {
  const table = cohortTable(warrantyAnswer(), words, links);
  const text = (key: string, row: number) =>
    table.columns.find((column) => column.key === key)!.text(table.rows[row]!);

  it('rows: rounded to whole money; the total is of the cents', () => {
    expect(text('paid', 1)).toBe('11,001');
    expect(text('toCome', 3)).toBe('25,048');
    expect(text('off', 3)).toBe('8,330');
    const total = (key: string) => table.columns.find((column) => column.key === key)!.total;
    expect(total('paid')).toBe('43,291');
    expect(total('toCome')).toBe('76,561');
    expect(total('off')).toBe('13,863');
    expect(total('cars')).toBe('12,160');
  });

  it('a half-year with nothing to come: no give or take', () => {
    expect(text('toCome', 0)).toBe('0');
    expect(text('off', 0)).toBe('');
  });

  it('a half-year unlike others: marked, with its figures in a sentence', () => {
    expect(table.rows.map(({ stand }) => stand)).toEqual([
      'as_expected',
      'as_expected',
      'above',
      'as_expected',
    ]);
    expect(table.unlike).toEqual([
      {
        cohort: '2025-H1',
        before: '2025 H1 stands above: ',
        claims: '40 claims',
        after: ' where 22 were expected of such cars (1.8 times, 1.3–2.5).',
      },
    ]);
  });

  it('cars and paid: lead to the cars and claims of that half-year', () => {
    const link = (key: string) =>
      table.columns.find((column) => column.key === key)!.link!(table.rows[1]!)!.query;
    expect(link('cars')).toEqual({ from: '2024-07-01', to: '2024-12-31' });
    expect(link('paid')).toEqual({ asOf: '2026-02-01', cohort: '2024-H2', counted: undefined });
  });

  it('no interval at all: said in the row', () => {
    const answer = warrantyAnswer();
    const cohorts = answer.cohorts.map((cohort) => ({ ...cohort, standardErrorCents: null }));
    const { columns, rows } = cohortTable({ ...answer, cohorts }, words, links);
    expect(columns.find(({ key }) => key === 'off')!.text(rows[3]!)).toBe('not known yet');
  });
});

describe('triangleTable', () => {
  it('factors: stand under the half-year they lead to, with the two sums they are made of', () => {
    const { columns, rows } = triangleTable(warrantyAnswer());
    const row = (key: string) => rows.find((one) => one.key === key)!.cells;
    expect(row('2024-H2')).toEqual(['900.00', '8,000.00', '11,000.50', '', '27,262.00']);
    expect(row('to')).toEqual(['', '23,000.49', '31,000.50', '25,290.00']);
    expect(row('from')).toEqual(['', '2,700.00', '17,000.00', '20,000.00']);
    expect(row('factor')).toEqual(['', '8.518700', '1.823560', '1.264500']);
    expect(row('sigma')).toEqual(['', '812.50', '90.25', 'not defined']);
    expect(columns.map(({ label }) => label)).toEqual([
      'Finished in',
      'that half-year',
      '+1',
      '+2',
      '+3',
      'in all, expected',
    ]);
  });
});

describe('branchRows', () => {
  it('branches: by name, a miss with its word, each leading to its claims', () => {
    const { chart, columns, rows } = branchRows(warrantyAnswer(), words, links)!;
    expect(chart.rows.map(({ label, count, text, word }) => [label, count, text, word])).toEqual([
      ['HAV', '49 / 46', '1.1', ''],
      ['TAN', '66 / 40', '1.7', 'above'],
      ['ULV', '21 / 34', '0.6', 'below'],
    ]);
    const claims = columns.find(({ key }) => key === 'claims')!;
    expect(claims.link!(rows[1]!)!.query).toMatchObject({ branch: 'TAN', counted: 'true' });
    expect(chart.summary).toContain('TAN 66 of 40 1.7 (1.3–2.1) above');
  });

  it('rates of the scope alone: said, and none where one branch would be held against itself', () => {
    expect(branchRows(warrantyAnswer({ reference: 'scope' }), words, links)!.note).toContain(
      'by the rates of the branches shown',
    );
    expect(branchRows(branchWarrantyAnswer({ reference: 'scope' }), words, links)).toBeNull();
  });
});

describe('expectedTable', () => {
  it('a line: the rate times the rows’ own car-years; a rate that may not be told leads to nothing', () => {
    const told = warrantyAnswer();
    const untold = { ...told.expectedRates[0]!, claims: null, carYears: null };
    const { columns, rows } = expectedTable(
      { ...told, expectedRates: [...told.expectedRates, untold] },
      words,
    );
    const expected = columns.find(({ key }) => key === 'expected')!;
    expect(rows.map((row) => expected.text(row))).toEqual(['15.00', '']);
  });
});

describe('processRows', () => {
  it('checks and thin product: seven rows, each with the cars that missed it, of how many', () => {
    const { chart, rows } = processRows(warrantyAnswer());
    expect(chart.rows).toHaveLength(7);
    expect(rows.at(-1)!.missed).toBe('under 70 % of the norm');
    const drains = chart.rows.find(({ key }) => key === 'drainsClear')!;
    expect(drains).toMatchObject({ count: '20 of 420', text: '2.4', word: 'above' });
    expect(chart.summary).toContain('drain holes left closed 2.4 times as likely (1.6–3.5)');
  });

  it('no ratio: why not, in the words of each case', () => {
    const why = (more: Parameters<typeof processRisk>[1]) =>
      processRows(warrantyAnswer({ process: [processRisk('linersOff', more)] })).chart.rows[0]!
        .text;
    const table = {
      ageBand: '5-9',
      exposedCars: 8,
      exposedClaims: 0,
      unexposedCars: 9,
      unexposedClaims: 0,
    } as const;
    expect(why({ strata: 0, tables: [] })).toBe('too few cars yet');
    expect(why({ strata: 0, tables: [{ ...table, exposedCars: 0 }] })).toBe('never missed');
    expect(why({ strata: 0, tables: [{ ...table, unexposedCars: 0 }] })).toBe('never done');
    expect(why({ strata: 1, tables: [table] })).toBe('no claim yet');
  });

  it('the fourfold tables: one line each, named by what was missed', () => {
    const lines = strataRows(processRows(warrantyAnswer()).rows);
    expect(lines).toHaveLength(7);
    expect(lines[0]).toMatchObject({ missed: 'arch liners left on', exposedCars: 20 });
  });
});

describe('curvesPicture', () => {
  it('groups: their names, where the axis starts, and what the log-rank test says in words', () => {
    const { chart, note, sums } = curvesPicture(warrantyAnswer(), words);
    expect(chart.curves.map(({ label }) => label)).toEqual(['cavity', 'full']);
    expect(note).toContain('Axis starts at 95.');
    expect(note).toContain('They differ by more than chance: log-rank p\u00a0<\u00a00.001.');
    expect(sums).toContain('cavity 46 first claims where 30.50 were expected');
    expect(sums).toContain('chi-square 14.20');
  });

  it('no test: no word of it', () => {
    const { note, sums } = curvesPicture(warrantyAnswer({ logRank: null }), words);
    expect(note).not.toContain('og-rank');
    expect(sums).toBe('');
  });

  it('the table: every sixth month with the first claims since the row before, so that they add up', () => {
    const { rows } = curvesPicture(warrantyAnswer(), words);
    const full = rows.filter(({ group }) => group === 'full');
    expect(full.map(({ month }) => month)).toEqual([6, 12, 18, 24, 30, 36]);
    expect(full.reduce((sum, { claims }) => sum + claims, 0)).toBe(36);
  });

  it('one branch: is not told apart by branch or region', () => {
    expect(usefulGroupings(branchWarrantyAnswer())).toEqual(['package', 'ageBand', 'cohort']);
  });
});

describe('zoneTable', () => {
  it('zones: most claims first, those without any left out, each leading to its claims', () => {
    const { rows, columns } = zoneTable(warrantyAnswer(), words, links);
    expect(rows.map(({ name }) => name)).toEqual(['bulkhead drain', 'sill, inner']);
    expect(columns[1]!.link!(rows[0]!)!.query).toMatchObject({
      zone: 'bulkhead_drain',
      counted: 'true',
    });
    expect(columns.find(({ key }) => key === 'claims')!.total).toBe('136');
  });
});

describe('leftOut', () => {
  it('what stands outside: counted, with where it is listed', () => {
    const left = leftOut(warrantyAnswer(), words, links);
    expect(left.map((one) => one.words)).toEqual([
      '80 cars sold without a warranty',
      '3 claims made after the warranty’s end',
      '12 claims refused',
      expect.stringContaining('€1,204.50 paid after'),
    ]);
    expect(left[2]!.link!.query).toMatchObject({ decision: 'refused', counted: 'false' });
  });

  it('nothing outside: nothing said', () => {
    expect(leftOut(noWarranty(), words, links)).toEqual([]);
  });
});
