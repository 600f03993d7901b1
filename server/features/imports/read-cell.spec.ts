import type { ImportField, ImportFieldKind } from '#shared/domain/import-field';
import { importField } from '#shared/domain/import-field';
import { importFields } from '#shared/domain/import-fields';
import { readCell, type CellReading } from './read-cell';

const READING: CellReading = {
  options: { delimiter: ';', encoding: 'utf-8', decimal: ',', dateOrder: 'dmy' },
  today: '2026-02-02',
  packages: [{ code: 'full', name: 'Full treatment' }],
};
const field = (kind: ImportFieldKind, more: Partial<ImportField> = {}): ImportField =>
  importField({ field: 'x', label: 'X', kind, ...more });
const read = (
  text: string,
  kind: ImportFieldKind,
  options: Partial<CellReading['options']> = {},
): unknown => {
  const cell = readCell(text, field(kind), {
    ...READING,
    options: { ...READING.options, ...options },
  });
  return cell && ('value' in cell ? cell.value : 'refused');
};

describe('a cell of an amount', () => {
  it.each([
    ['1.780,50', ',', 178_050],
    ['1 780,5', ',', 178_050],
    ['1\u00a0780', ',', 178_000],
    ['€ 0,29', ',', 29],
    ['19,90 EUR', ',', 1990],
    ['1,780.50', '.', 178_050],
    ["1'780.50", '.', 178_050],
    ['1.15', '.', 115],
    ['4.35', '.', 435],
    ['8.700', '.', 870],
    ['10000000.00', '.', 1_000_000_000],
    ['-5', '.', -500],
    ['12.50', ',', 'refused'],
    ['1,234.5', ',', 'refused'],
    ['1.2345', '.', 'refused'],
    ['1,78.50', '.', 'refused'],
    ['1e5', '.', 'refused'],
    ['12345678901234567890', '.', 'refused'],
    ['ten', '.', 'refused'],
    ['', '.', undefined],
  ] as const)('given %j with %j, is %j minor units exactly', (text, decimal, cents) => {
    expect(read(text, 'amount', { decimal })).toBe(cents);
  });
});

describe('a cell of a day', () => {
  it.each([
    ['2026-01-28', 'dmy', '2026-01-28'],
    ['2026/1/28', 'mdy', '2026-01-28'],
    ['2026-01-28T10:30:00Z', 'ymd', '2026-01-28'],
    ['28.01.2026', 'dmy', '2026-01-28'],
    ['28. 1. 2026', 'dmy', '2026-01-28'],
    ['28.01.2026 00:00', 'dmy', '2026-01-28'],
    ['01/28/2026', 'mdy', '2026-01-28'],
    ['28.01.26', 'dmy', '2026-01-28'],
    ['28.01.99', 'dmy', '1999-01-28'],
    ['26-01-28', 'ymd', '2026-01-28'],
    ['28.01.2026', 'ymd', 'refused'],
    ['28.01.2026', 'mdy', 'refused'],
    ['31.02.2026', 'dmy', 'refused'],
    ['46050', 'dmy', 'refused'],
    ['yesterday', 'dmy', 'refused'],
  ] as const)('given %j read as %s, is %s', (text, dateOrder, date) => {
    expect(read(text, 'date', { dateOrder })).toBe(date);
  });

  it.each([
    ['2009-05', '2009-05'],
    ['05/2009', '2009-05'],
    ['5.2009', '2009-05'],
    ['31.05.2009', '2009-05'],
    ['13/2009', 'refused'],
  ])('given %j as a month, is %s', (text, month) => {
    expect(read(text, 'month')).toBe(month);
  });
});

describe('a cell of minutes, a whole number or a measure', () => {
  it.each([
    ['105', 'minutes', 105],
    ['1:45', 'minutes', 105],
    ['1h45', 'minutes', 105],
    ['2 h', 'minutes', 120],
    ['105 min', 'minutes', 105],
    ['105,00', 'minutes', 105],
    ['1:75', 'minutes', 'refused'],
    ['1,5', 'minutes', 'refused'],
    ['148.200', 'whole', 148_200],
    ['148.20', 'whole', 'refused'],
    ['14,5', 'decimal', 14.5],
    ['-3', 'decimal', -3],
    ['61 %', 'decimal', 61],
  ] as const)('given %j as %s, is %j', (text, kind, value) => {
    expect(read(text, kind)).toBe(value);
  });
});

describe('a cell of words', () => {
  const fields = importFields('jobs', { products: [], packages: READING.packages });
  const named = (name: string): ImportField => fields.find((one) => one.field === name)!;
  it.each([
    ['finding1.zone', 'Sill  inner', 'sill_inner'],
    ['finding1.structural', 'TRUE', true],
    ['finding1.structural', '0', false],
    ['checks.driedOut', 'n/a', 'na'],
    ['checks.driedOut', 'Y', 'yes'],
    ['checks.driedOut', '0', 'no'],
    ['package', 'FULL', 'full'],
    ['package', 'full treatment', 'full'],
    ['vehicle.make', ' Velder ', 'Velder'],
    ['notes', ' kept as it is\n', ' kept as it is\n'],
    ['notes', "'=SUM(A1)", '=SUM(A1)'],
    ['notes', "'quoted'", "'quoted'"],
    ['jobRef', " '-7", "'-7"],
  ])('given %s and %j, is %j', (name, text, value) => {
    expect(readCell(text, named(name), READING)).toEqual({ value });
  });

  it.each([
    ['finding1.zone', 'roof'],
    ['finding1.structural', 'perhaps'],
    ['finding1.structural', 'constructor'],
    ['package', '__proto__'],
    ['vehicle.make', 'M\uFFFDller'],
  ])('given %s and %j, says what is wrong', (name, text) => {
    expect(readCell(text, named(name), READING)).toEqual({ problem: expect.any(String) });
  });
});
