import { rowsBelow } from './check-file';
import type { FileRow } from './read-rows';
import { refusedLines } from './refused-rows';
import type { FileQuestion } from './row-world';

/** Some rows to be written, how many were refused by the check among them, and how far into the file that is. */
export interface RowsToWrite {
  rows: FileRow[];
  refused: number;
  done: number;
}

/** Rows that one commit takes: other requests wait for it some milliseconds. */
const ROWS_A_CHUNK = 25;

/** The rows of a checked file that were not refused, a few at a time, beginning after those that are done. */
export async function* rowsToWrite(
  question: FileQuestion,
  refusedPath: string,
  after: number,
): AsyncGenerator<RowsToWrite> {
  const skipped = await refusedLines(refusedPath);
  let done = 0;
  let refused = 0;
  let rows: FileRow[] = [];
  for await (const row of rowsBelow(question)) {
    done += 1;
    if (done <= after) continue;
    if (skipped.has(row.line)) refused += 1;
    else rows.push(row);
    if (rows.length < ROWS_A_CHUNK && refused < 1000) continue;
    yield { rows, refused, done };
    rows = [];
    refused = 0;
  }
  if (rows.length > 0 || refused > 0) yield { rows, refused, done };
}
