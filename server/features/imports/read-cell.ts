import type { ReadingOptions } from '#shared/contracts/imports';
import { headingKey, type ImportField } from '#shared/domain/import-field';
import { readDay, readMonth, WRITTEN } from './read-day';
import { centsOf, decimalOf, wholeOf, writtenNumber, type WrittenNumber } from './read-number';

/** What reading a cell needs beside its field. */
export interface CellReading {
  options: ReadingOptions;
  /** The branch's local date. */
  today: string;
  packages: readonly { code: string; name: string }[];
}

/** What a cell says: a value, nothing (`undefined`), or what is wrong with it. */
export type Cell = { value: string | number | boolean } | { problem: string } | undefined;

/** Reads one cell as a field asks for it. */
export function readCell(sent: string, field: ImportField, reading: CellReading): Cell {
  // What a spreadsheet would have run was defused when we gave it out (rule 62); it comes back as it was.
  const text = sent.replace(/^'(?=[=+\-@\t\r])/, '');
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  if (reading.options.encoding === 'utf-8' && text.includes('\uFFFD')) {
    return { problem: 'has letters that are not UTF-8; choose Windows-1252 for this file' };
  }
  // Notes keep their spaces and line ends; everything else has them by accident.
  if (field.kind === 'text') return { value: isNote(field) ? text : trimmed };
  if (field.kind === 'reference') return { value: trimmed };
  return readWord(trimmed, field, reading) ?? { problem: said(trimmed, field, reading) };
}

function isNote({ field }: ImportField): boolean {
  return field === 'notes' || field === 'note';
}

function readWord(text: string, field: ImportField, reading: CellReading): Cell {
  const { dateOrder } = reading.options;
  switch (field.kind) {
    case 'date':
      return given(readDay(text, dateOrder, reading.today));
    case 'month':
      return given(readMonth(text, dateOrder, reading.today));
    case 'yesno':
      return given(YES_OR_NO[text.toLowerCase()]);
    case 'choice':
      return given(readChoice(text, field, reading));
    case 'minutes':
      return given(readMinutes(text, reading));
    default:
      return readNumber(text, field, reading);
  }
}

function readNumber(text: string, { kind }: ImportField, { options }: CellReading): Cell {
  const bare = kind === 'amount' ? withoutCurrency(text) : text.replace(/\s*(?:%|°\s?C)$/, '');
  const number = writtenNumber(bare, options.decimal);
  if (!number) return undefined;
  const value = READ[kind as keyof typeof READ](number);
  if (kind === 'amount' && value === undefined) {
    return { problem: `${quoted(text)} has more than two decimals` };
  }
  return given(value);
}

const READ: Record<
  'whole' | 'cents' | 'amount' | 'decimal',
  (n: WrittenNumber) => number | undefined
> = { whole: wholeOf, cents: wholeOf, amount: centsOf, decimal: decimalOf };

const CLOCK = /^(\d{1,3}):([0-5]\d)(?::00)?$/;
const HOURS = /^(\d{1,3})\s*h(?:\s*([0-5]?\d)\s*(?:m|min)?)?$/i;

function readMinutes(text: string, { options }: CellReading): number | undefined {
  const hours = CLOCK.exec(text) ?? HOURS.exec(text);
  if (hours) return Number(hours[1]) * 60 + Number(hours[2] ?? 0);
  const number = writtenNumber(text.replace(/\s*min(?:utes)?\.?$/i, ''), options.decimal);
  return number && wholeOf(number);
}

function withoutCurrency(text: string): string {
  return text.replace(/^(?:\p{Sc}|[A-Z]{3})\s*|\s*(?:\p{Sc}|[A-Z]{3})$/gu, '');
}

const YES_OR_NO: Readonly<Record<string, boolean>> = Object.assign(Object.create(null) as object, {
  ...{ yes: true, y: true, true: true, '1': true },
  ...{ no: false, n: false, false: false, '0': false },
});

function readChoice(
  text: string,
  { field, choices = [] }: ImportField,
  { packages }: CellReading,
): string | undefined {
  const key = headingKey(text);
  const word = choices.find((choice) => headingKey(choice) === key);
  if (word !== undefined) return word;
  if (field === 'package') return packages.find(({ name }) => headingKey(name) === key)?.code;
  if (!choices.includes('yes')) return undefined;
  if (key === 'notapplicable') return 'na';
  const answer = YES_OR_NO[key];
  return answer === undefined ? undefined : answer ? 'yes' : 'no';
}

function given(value: string | number | boolean | undefined): Cell {
  return value === undefined ? undefined : { value };
}

/** What a cell that could not be read should have been, for a person. */
function said(text: string, field: ImportField, { options, packages }: CellReading): string {
  const cell = quoted(text);
  const decimal = options.decimal === ',' ? 'comma' : 'point';
  switch (field.kind) {
    case 'date':
      return `${cell} is no day written ${WRITTEN[options.dateOrder]}`;
    case 'month':
      return `${cell} is no month such as 2009-05, and no day written ${WRITTEN[options.dateOrder]}`;
    case 'yesno':
      return `${cell} is neither yes nor no`;
    case 'choice':
      return field.field === 'package'
        ? `${cell} is none of the packages: ${packages.map(({ code, name }) => `${code} (${name})`).join(', ')}`
        : `${cell} is none of ${(field.choices ?? []).join(', ')}`;
    case 'minutes':
      return `${cell} is neither whole minutes nor hours and minutes such as 1:45`;
    case 'amount':
      return `${cell} is no amount with a decimal ${decimal}`;
    case 'decimal':
      return `${cell} is no number with a decimal ${decimal}`;
    default:
      return `${cell} is no whole number`;
  }
}

/** The text in quotes, shortened, so that a message stays one readable line. */
function quoted(text: string): string {
  return JSON.stringify(text.length > 40 ? `${text.slice(0, 40)}…` : text);
}
