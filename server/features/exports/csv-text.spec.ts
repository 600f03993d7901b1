import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { defused } from '#shared/domain/defused';
import { csvHeader, csvRows } from './csv-text';

const COLUMNS = ['text', 'vehicle.make', 'number', 'flag', 'nothing'];

describe('csvRows', () => {
  it('given cells of every kind, writes them raw with CRLF, and null as nothing (rule 62)', () => {
    const record = { text: 'a', vehicle: { make: 'b' }, number: -1.5, flag: false, nothing: null };
    expect(csvHeader(COLUMNS)).toBe('text,vehicle.make,number,flag,nothing\r\n');
    expect(csvRows(COLUMNS, [record, { ...record, flag: true }])).toBe(
      'a,b,-1.5,false,\r\na,b,-1.5,true,\r\n',
    );
  });

  it('given a nested field that is not there, leaves its cell empty', () => {
    expect(csvRows(['largestStep.step', 'vehicle.key'], [{ largestStep: null, vehicle: {} }])).toBe(
      ',\r\n',
    );
  });

  it('given text that a spreadsheet would run, puts an apostrophe before it; never before a number', () => {
    for (const start of ['=', '+', '-', '@', '\t', '\r']) {
      expect(defused(`${start}1`)).toBe(`'${start}1`);
    }
    expect(defused('1-1')).toBe('1-1');
    expect(csvRows(['a', 'b'], [{ a: '=1+1', b: -1 }])).toBe("'=1+1,-1\r\n");
  });

  it('given no record, writes nothing', () => {
    expect(csvRows(COLUMNS, [])).toBe('');
  });

  /** Library reference of this spec: csv-parse 7.0.3. */
  it('given any text, is read back as it was', () => {
    const cell = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.string({ unit: fc.constantFrom('"', ',', '\r', '\n', ' ', "'", '=', 'x') }),
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1 }), (rows) => {
        const text = csvRows(
          ['a', 'b'],
          rows.map(([a, b]) => ({ a, b })),
        );
        const back = parse(text, { record_delimiter: '\r\n', relax_column_count: false });
        expect(back).toEqual(rows.map((row) => row.map(defused)));
      }),
    );
  });
});
