import type { ImportColumn } from '#shared/contracts/imports';
import { headingKey, type ImportField } from '#shared/domain/import-field';
import { matchHeadings } from '#shared/domain/import-fields';
import { FileProblem } from './file-problem';
import type { FilledColumn } from './read-row';

/** More columns than a file of jobs could fill several times over. */
const MOST_COLUMNS = 500;
const EXAMPLES = 3;
const LONGEST_EXAMPLE = 80;

/** What a heading means to a branch, as a person last said it: heading key → field, or null for left out. */
export type Remembered = ReadonlyMap<string, string | null>;

/** The columns of a file: each heading with what it is taken to mean, what a person said of it before going before its name. */
export function planColumns(
  rows: readonly (readonly string[])[],
  fields: readonly ImportField[],
  remembered: Remembered,
): ImportColumn[] {
  const [headings = [], ...values] = rows;
  if (headings.length > MOST_COLUMNS) {
    throw new FileProblem(`The file has ${headings.length} columns; ${MOST_COLUMNS} are taken.`);
  }
  const known = new Map(fields.map((field) => [field.field, field]));
  const filled = new Set<string>();
  const keys = headings.map(headingKey);
  const chosen = keys.map((key, index) => {
    const said = remembered.get(key);
    // A heading that stands twice was said of the first.
    if (said === undefined || keys.indexOf(key) !== index) return undefined;
    const field = said === null ? null : known.get(said);
    if (field && filled.has(field.fills)) return undefined;
    if (field) filled.add(field.fills);
    return field;
  });
  const matched = matchHeadings(headings, fields);
  return headings.map((heading, index) => {
    const said = chosen[index];
    const byName = matched[index];
    const taken = said === undefined && byName !== undefined && filled.has(byName.fills);
    const field = said === undefined && !taken ? byName : said;
    if (said === undefined && field) filled.add(field.fills);
    return {
      index,
      heading: heading.trim(),
      field: field?.field ?? null,
      chosen: said !== undefined,
      examples: examplesOf(values, index),
    };
  });
}

/** The columns that fill something. */
export function filledColumns(
  columns: readonly ImportColumn[],
  fields: readonly ImportField[],
): FilledColumn[] {
  const known = new Map(fields.map((field) => [field.field, field]));
  return columns.flatMap(({ index, heading, field: name }) => {
    const field = name === null ? undefined : known.get(name);
    return field ? [{ index, heading, field }] : [];
  });
}

/** Labels of what a new job or claim needs and no column fills. */
export function missingFields(
  columns: readonly ImportColumn[],
  fields: readonly ImportField[],
): string[] {
  const filled = new Set(filledColumns(columns, fields).map(({ field }) => field.fills));
  return fields
    .filter(({ required, fills }) => required && !filled.has(fills))
    .map(({ field }) => field);
}

function examplesOf(rows: readonly (readonly string[])[], index: number): string[] {
  const examples: string[] = [];
  for (const row of rows) {
    const value = (row[index] ?? '').trim();
    if (value !== '') examples.push(value.slice(0, LONGEST_EXAMPLE));
    if (examples.length === EXAMPLES) break;
  }
  return examples;
}
