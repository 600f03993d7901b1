import { CsvError, parse, type Parser } from 'csv-parse';
import { createReadStream } from 'node:fs';
import type { ReadingOptions } from '#shared/contracts/imports';
import { FileProblem } from './file-problem';

/** A row with its cells as sent; `line` is where it begins, the headings being line 1. */
export interface FileRow {
  line: number;
  cells: string[];
}

/** More than a row of every column with the longest notes needs: what is longer has lost a quote or a line end. */
const LONGEST_ROW = 1024 * 1024;

type Reading = Pick<ReadingOptions, 'delimiter' | 'encoding'>;

/** Reads a file row by row, the headings first; rows that are empty throughout are passed over. Throws `FileProblem`. */
export async function* readRows(path: string, options: Reading): AsyncGenerator<FileRow> {
  const parser = rowParser(options.delimiter);
  const source = createReadStream(path, { highWaterMark: 256 * 1024 });
  void feed(source, parser, options.encoding);
  let last = 0;
  try {
    for await (const { record, info } of parser as AsyncIterable<Parsed>) {
      // The library tells the line on which a row ends.
      yield { line: info.lines - lineEnds(record), cells: record };
      last = info.lines;
    }
  } catch (error) {
    throw problemOf(error, last);
  } finally {
    source.destroy();
    parser.destroy();
  }
}

interface Parsed {
  record: string[];
  info: { lines: number };
}

/** A parser that is strict about nothing but what cannot be read. */
export function rowParser(delimiter: string): Parser {
  return parse({
    bom: true,
    delimiter,
    info: true,
    max_record_size: LONGEST_ROW,
    relax_column_count: true,
    relax_quotes: true,
    skip_empty_lines: true,
    skip_records_with_empty_values: true,
  });
}

/** Decodes bytes of a file piece by piece. */
export function decoderOf(encoding: ReadingOptions['encoding']): (bytes: Buffer) => string {
  const decoder = new TextDecoder(encoding);
  return (bytes) => decoder.decode(bytes, { stream: true });
}

async function feed(
  source: AsyncIterable<Buffer>,
  parser: Parser,
  encoding: ReadingOptions['encoding'],
): Promise<void> {
  const decode = decoderOf(encoding);
  try {
    for await (const bytes of source) {
      if (parser.destroyed) return;
      // The parser reads UTF-8 itself.
      const more = parser.write(encoding === 'utf-8' ? bytes : Buffer.from(decode(bytes)));
      if (!more) await drained(parser);
    }
    if (!parser.destroyed) parser.end();
  } catch (error) {
    parser.destroy(error instanceof Error ? error : new Error('a file could not be read'));
  }
}

function drained(parser: Parser): Promise<void> {
  return new Promise((resolve) => {
    const settle = (): void => {
      parser.off('drain', settle).off('close', settle);
      resolve();
    };
    parser.on('drain', settle).on('close', settle);
  });
}

function lineEnds(cells: readonly string[]): number {
  let ends = 0;
  for (const cell of cells) {
    if (cell.includes('\n') || cell.includes('\r')) ends += cell.split(/\r\n|\r|\n/).length - 1;
  }
  return ends;
}

function problemOf(error: unknown, last: number): unknown {
  if (!(error instanceof CsvError)) return error;
  if (error.code === 'CSV_QUOTE_NOT_CLOSED') {
    return new FileProblem(
      `A quote that opens after line ${last} is never closed; close or remove it and send the file again.`,
    );
  }
  if (error.code === 'CSV_MAX_RECORD_SIZE') {
    return new FileProblem(
      `The row after line ${last} is longer than 1 MB; a line end or a closing quote is missing there.`,
    );
  }
  return new FileProblem(`The file cannot be read after line ${last}.`);
}
