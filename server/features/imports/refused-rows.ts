import { stringify } from 'csv-stringify/sync';
import { appendFileSync, createReadStream, existsSync } from 'node:fs';
import { createInterface } from 'node:readline';
import { defused } from '#shared/domain/defused';
import { headingKey, WHY_REFUSED } from '#shared/domain/import-field';
import type { ToldProblem } from './tell-problems';

/** A refused row as it is kept beside its file. */
export interface RefusedRow {
  line: number;
  cells: readonly string[];
  problems: readonly ToldProblem[];
}

/** Keeps refused rows, one JSON text a line, behind those kept already. */
export function keepRefused(path: string, rows: readonly RefusedRow[]): void {
  if (rows.length === 0) return;
  appendFileSync(path, rows.map((row) => `${JSON.stringify(row)}\n`).join(''));
}

/** The refused rows in the order in which they were kept. */
async function* keptRefused(path: string): AsyncGenerator<RefusedRow> {
  if (!existsSync(path)) return;
  const lines = createInterface({ input: createReadStream(path), crlfDelay: Infinity });
  for await (const line of lines) yield JSON.parse(line) as RefusedRow;
}

/** The lines of the refused rows. */
export async function refusedLines(path: string): Promise<ReadonlySet<number>> {
  const lines = new Set<number>();
  for await (const { line } of keptRefused(path)) lines.add(line);
  return lines;
}

const ROWS_A_CHUNK = 500;

/** The refused rows as a CSV with the file's own delimiter, each with its reasons in a last column: to mend and send again. */
export async function* refusedCsv(
  path: string,
  headings: readonly string[],
  delimiter: string,
): AsyncGenerator<string> {
  const own = headings.map((heading) => headingKey(heading) !== headingKey(WHY_REFUSED));
  const kept = (cells: readonly string[]): string[] =>
    [...cells, ...Array<string>(Math.max(0, headings.length - cells.length)).fill('')].filter(
      (_, index) => own[index] ?? true,
    );
  const text = (rows: readonly string[][]): string =>
    stringify([...rows], { ...FORMAT, delimiter });
  let rows = [[...kept(headings), WHY_REFUSED]];
  for await (const { cells, problems } of keptRefused(path)) {
    rows.push([...kept(cells), problems.map(tellProblem).join('; ')]);
    if (rows.length < ROWS_A_CHUNK) continue;
    yield text(rows);
    rows = [];
  }
  if (rows.length > 0) yield text(rows);
}

/** One problem as a sentence with the heading it is about. */
function tellProblem({ heading, message }: ToldProblem): string {
  return heading === null ? message : `${heading}: ${message}`;
}

const FORMAT = {
  record_delimiter: '\r\n',
  quoted_match: /[\r\n]/,
  cast: {
    // Numbers as sent are no formulas, and an apostrophe before them would only be in the way (rule 62).
    string: (cell: string): string =>
      /^[-+]?[\d.,' \u00a0\u202f]+$/.test(cell) ? cell : defused(cell),
  },
} as const;
