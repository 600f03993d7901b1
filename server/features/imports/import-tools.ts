import type { PackedScope } from '#db/scope';
import type { FileQuestion } from './row-world';

/** Pieces of JSON text from the thread that reads files, in order. */
export interface ReadPieces extends AsyncIterable<string> {
  /** Wants no more. */
  cancel(): void;
}

/** A question to the thread that reads files. */
export interface FileTask extends FileQuestion {
  /** The one branch whose rows may be read. */
  scope: PackedScope;
  branch: string;
  /** Where refused rows are kept. */
  refusedPath: string;
}

/** Reads files off the thread that answers requests. */
export interface FileReader {
  /** Says of every row what confirming would do, as `CheckStep`s. */
  check(task: FileTask): ReadPieces;
  /** The rows that are to be written, as `RowsToWrite`, after those that are done. */
  rows(task: FileTask & { after: number }): ReadPieces;
  /** Ends its threads; what they still work on fails. */
  close(): Promise<void>;
}

/** What the desk works with beside the store. */
export interface ImportTools {
  /** Where files lie, each under its id. */
  folder: string;
  reader: FileReader;
  /** The real time. */
  now: () => Date;
  /** The time by which business dates are judged. */
  today: (timeZone: string) => string;
  /** Tells whoever had a file written that its writing has ended; inside a write. */
  tellEnded: (personId: number, ended: EndedWriting) => void;
}

/** How the writing of a file has ended, in words. */
export interface EndedWriting {
  branch: string;
  fileName: string;
  outcome: string;
  counts: readonly string[];
  path: string;
}
