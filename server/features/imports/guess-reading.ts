import type { ReadingOptions } from '#shared/contracts/imports';
import { matchHeadings } from '#shared/domain/import-fields';
import type { ImportField } from '#shared/domain/import-field';
import type { InspectedFile } from './inspect-file';
import { decoderOf, rowParser } from './read-rows';

const DELIMITERS = [',', ';', '\t', '|'] as const;
/** Rows by which a delimiter is judged, and values by which a way of writing is. */
const JUDGED = 200;

/** Guesses how a file is to be read. Certain only where a value rules the other ways out; a person may correct it. */
export async function guessReading(
  file: InspectedFile,
  fields: readonly ImportField[],
): Promise<ReadingOptions> {
  const { encoding } = file;
  const { delimiter, rows } = await guessDelimiter(file);
  const [headings = [], ...values] = rows;
  const matched = matchHeadings(headings, fields);
  const cells = (...kinds: ImportField['kind'][]): string[] => {
    const known = matched.some((field) => field && kinds.includes(field.kind));
    return values.flatMap((row) =>
      row.filter((_, at) => (known ? kinds.includes(matched[at]?.kind ?? 'text') : true)),
    );
  };
  return {
    delimiter,
    encoding,
    decimal: guessDecimal(cells('amount', 'decimal'), delimiter),
    dateOrder: guessDateOrder(cells('date', 'month')),
  };
}

/** The first rows of a file as they are read with a delimiter; a last row that is cut off is left out. */
export function headRows(
  { head, whole, encoding }: Pick<InspectedFile, 'head' | 'whole' | 'encoding'>,
  delimiter: string,
): Promise<string[][]> {
  return new Promise((resolve) => {
    const parser = rowParser(delimiter);
    const rows: string[][] = [];
    const settle = (): void => resolve(rows.slice(0, JUDGED));
    parser.on('data', ({ record }: { record: string[] }) => rows.push(record));
    parser.on('error', settle).on('end', settle);
    parser.write(Buffer.from(decoderOf(encoding)(head)), () => {
      // The rows of a cut file that are whole have been told by the next turn.
      if (whole) parser.end();
      else setImmediate(settle);
    });
  });
}

async function guessDelimiter(
  file: InspectedFile,
): Promise<{ delimiter: ReadingOptions['delimiter']; rows: string[][] }> {
  let best = { delimiter: DELIMITERS[0] as ReadingOptions['delimiter'], rows: [[]] as string[][] };
  let most = -1;
  for (const delimiter of DELIMITERS) {
    const rows = await headRows(file, delimiter);
    const width = rows[0]?.length ?? 0;
    const same = rows.filter((row) => row.length === width).length / Math.max(1, rows.length);
    // As many columns in every row as there are headings; among those the delimiter that parts most.
    const score = width > 1 ? same * 1000 + Math.min(width, 900) : 0;
    if (score > most) {
      best = { delimiter, rows };
      most = score;
    }
  }
  return best;
}

/** Comma or point before one or two last digits; where no value shows it, the comma goes with the semicolon. */
function guessDecimal(values: readonly string[], delimiter: string): '.' | ',' {
  const commas = values.filter((value) => /\d,\d{1,2}\D*$/.test(value.trim())).length;
  const points = values.filter((value) => /^\D*[\d,\s]*\d\.\d{1,2}\D*$/.test(value.trim())).length;
  if (commas === points) return delimiter === ';' && commas === 0 ? ',' : '.';
  return commas > points ? ',' : '.';
}

const PARTS = /^(\d{1,4})[-/.]\s?(\d{1,2})[-/.]\s?(\d{1,4})\b/;

/** Day first unless a value rules it out; year first where no year stands last, because those are read so in any order. */
function guessDateOrder(values: readonly string[]): ReadingOptions['dateOrder'] {
  let yearLast = 0;
  let impossibleDayFirst = 0;
  let impossibleMonthFirst = 0;
  for (const value of values) {
    const [, a = '', b = ''] = PARTS.exec(value.trim()) ?? [];
    if (a === '' || a.length === 4) continue;
    yearLast += 1;
    if (Number(b) > 12) impossibleDayFirst += 1;
    if (Number(a) > 12) impossibleMonthFirst += 1;
  }
  if (yearLast === 0) return 'ymd';
  return impossibleDayFirst > impossibleMonthFirst ? 'mdy' : 'dmy';
}
