import { LARGEST_FILE } from '#shared/contracts/imports';
import { importFields, matchHeadings } from '#shared/domain/import-fields';
import { importedFile } from '../../testing/import-answers';
import { branchOf } from './branch-of';
import { fieldGroups } from './field-groups';
import { refusalOf } from './file-refusal';
import { previewColumns, reasons } from './preview-rows';
import { startingFile, startingHeadings, usualDelimiter } from './starting-file';

const CATALOGUE = {
  products: [{ code: 'CW1', name: 'Cavity wax' }],
  packages: [{ code: 'full', name: 'Full' }],
};

describe('refusalOf', () => {
  it.each(['cars.xlsx', 'CARS.XLS', 'cars.ods'])('%s, a workbook, says how to save it', (name) => {
    expect(refusalOf({ name, size: 10 })).toContain('CSV (UTF-8)');
  });

  it('a CSV, is sent up to the limit and not beyond', () => {
    expect(refusalOf({ name: 'cars.csv', size: LARGEST_FILE })).toBeUndefined();
    expect(refusalOf({ name: 'cars.csv', size: LARGEST_FILE + 1 })).toContain('50 MB');
    expect(refusalOf({ name: 'cars.csv', size: 0 })).toContain('empty');
  });
});

describe('startingHeadings', () => {
  it.each(['jobs', 'claims'] as const)('of %s, are all read back by name alone', (kind) => {
    const headings = startingHeadings(kind, CATALOGUE);
    const fields = importFields(kind, CATALOGUE);
    expect(matchHeadings(headings, fields).every((field) => field !== undefined)).toBe(true);
  });

  it('of jobs, begin with what a row cannot do without and name no thing twice', () => {
    const fields = importFields('jobs', CATALOGUE);
    const headings = startingHeadings('jobs', CATALOGUE);
    const needed = fields.filter((field) => field.required).map((field) => field.label);
    expect(headings.slice(0, needed.length)).toEqual(needed);
    expect(headings).toContain('Cavity wax (CW1) ml');
    expect(headings.some((heading) => /minor units|^Product 1|Finding 3/.test(heading))).toBe(
      false,
    );
  });
});

describe('startingFile', () => {
  it('headings with a comma, quotes them, marks UTF-8 and ends the line', () => {
    expect(startingFile(['Job', 'Bought in, all'], ',')).toBe('\ufeffJob,"Bought in, all"\r\n');
  });

  it('where a comma parts decimals, parts cells by semicolons', () => {
    expect(usualDelimiter('de-DE')).toBe(';');
    expect(usualDelimiter('en-GB')).toBe(',');
  });
});

describe('fieldGroups', () => {
  it('of jobs, puts what is needed first and loses no field', () => {
    const fields = importFields('jobs', CATALOGUE);
    const [needed, ...others] = fieldGroups('jobs', fields);
    expect(needed!.fields.every((field) => field.required)).toBe(true);
    expect(others.flatMap((group) => group.fields).some((field) => field.required)).toBe(false);
    const all = [needed!, ...others].flatMap((group) => group.fields);
    expect(new Set(all)).toEqual(new Set(fields));
    const named = others.map((group) => group.name);
    expect(named).toContain('findings');
  });
});

describe('previewColumns', () => {
  it('of a file, leave out the columns that fill nothing and read cells by their place', () => {
    const file = importedFile();
    const columns = previewColumns(file);
    expect(columns.map((column) => column.label)).toEqual(['Line', 'Would be', 'Job', 'Done']);
    expect(columns.map((column) => column.text(file.preview[0]!))).toEqual([
      '2',
      'new',
      'W1',
      '28.01.2026',
    ]);
  });

  it('of a refused row, every reason is told under its heading', () => {
    expect(reasons(importedFile().refusedPreview[0]!)).toBe('Done: is not a day; has no model');
  });
});

describe('branchOf', () => {
  const branches = [{ code: 'HAV' }, { code: 'SOL' }];

  it('of the URL, is the one branch it names, else the only one there is', () => {
    expect(branchOf('SOL', branches)).toBe('SOL');
    expect(branchOf(['SOL', 'XX'], branches)).toBe('SOL');
    expect(branchOf(['SOL', 'HAV'], branches)).toBeUndefined();
    expect(branchOf('XX', branches)).toBeUndefined();
    expect(branchOf(undefined, [{ code: 'HAV' }])).toBe('HAV');
  });
});
