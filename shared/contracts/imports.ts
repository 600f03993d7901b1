import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { branchParams, code, MANAGERS, noQuery } from './fields';

/** Largest file taken: bytes, and rows below its headings. */
export const LARGEST_FILE = 50 * 1024 * 1024;
export const MOST_ROWS = 200_000;

export const IMPORT_KINDS = ['jobs', 'claims'] as const;
export type ImportKind = (typeof IMPORT_KINDS)[number];

/** How a file is to be read; guessed from the file and open to correction. */
export const readingOptions = z.strictObject({
  delimiter: z.enum([',', ';', '\t', '|']),
  encoding: z.enum(['utf-8', 'windows-1252']),
  decimal: z.enum(['.', ',']),
  dateOrder: z.enum(['ymd', 'dmy', 'mdy']),
});
export type ReadingOptions = z.output<typeof readingOptions>;

/**
 * - `checking`: being read and compared with what is stored; nothing is written.
 * - `ready`: its preview is complete; confirming writes it.
 * - `writing`: rows are being written.
 * - `done`, `cancelled`, `stopped`: ended; what was written stays. `stopped`: the server went down meanwhile.
 * - `failed`: it could not be read as a whole; `problem` says why.
 */
export const IMPORT_STATES = [
  'checking',
  'ready',
  'writing',
  'done',
  'cancelled',
  'stopped',
  'failed',
] as const;

export const importColumn = z.strictObject({
  /** Place in the file, from 0. */
  index: z.int().min(0),
  heading: z.string(),
  /** The field it fills (`shared/domain/import-fields.ts`), or null: left out. */
  field: z.string().nullable(),
  /** Set by a person, now or in an earlier file of the branch, rather than matched by name. */
  chosen: z.boolean(),
  /** The first values in it that are not empty. */
  examples: z.array(z.string()),
});
export type ImportColumn = z.output<typeof importColumn>;

export const previewRow = z.strictObject({
  /** Line in the file, its headings being line 1. */
  line: z.int(),
  ref: z.string().nullable(),
  status: z.enum(['new', 'changed', 'unchanged', 'refused']),
  values: z.array(z.string()),
  problems: z.array(
    z.strictObject({
      /** The heading of the column that is wrong, where one column is. */
      heading: z.string().nullable(),
      message: z.string(),
    }),
  ),
});
export type PreviewRow = z.output<typeof previewRow>;

const rowCounts = z.strictObject({
  rows: z.int(),
  new: z.int(),
  changed: z.int(),
  unchanged: z.int(),
  refused: z.int(),
});

/** A file as sent: how it is read, what it would change, and how far it has got. */
export const importedFile = z.strictObject({
  id: z.string(),
  branch: code,
  kind: z.enum(IMPORT_KINDS),
  fileName: z.string(),
  bytes: z.int(),
  receivedAt: z.string(),
  by: z.string(),
  state: z.enum(IMPORT_STATES),
  options: readingOptions,
  columns: z.array(importColumn),
  /** Required fields that no column fills. */
  missingFields: z.array(z.string()),
  /** Of the check so far; complete when `ready`. */
  counts: rowCounts,
  /** The first rows; refused ones among them say why. */
  preview: z.array(previewRow),
  /** The first refused rows, wherever they stand. */
  refusedPreview: z.array(previewRow),
  /** Rows checked or written, and how many there are (null while not known). */
  progress: z.strictObject({ done: z.int(), of: z.int().nullable() }),
  /** What has been written, by what it did. */
  written: z.strictObject({
    created: z.int(),
    replaced: z.int(),
    unchanged: z.int(),
    refused: z.int(),
  }),
  endedAt: z.string().nullable(),
  problem: z.string().nullable(),
});
export type ImportedFile = z.output<typeof importedFile>;

const imports = { topic: 'Import', access: MANAGERS, scope: 'branches', query: noQuery } as const;
const params = z.strictObject({ branch: z.string(), id: z.string().max(64) });

const sent = {
  ...imports,
  method: 'post',
  params: branchParams,
  body: 'file',
  out: importedFile,
  statuses: [201],
} as const;

export const putJobFile = defineEndpoint({
  ...sent,
  path: '/api/branches/:branch/jobs/file',
  summary:
    'Send a CSV of jobs (multipart, one part `file`): read and previewed, nothing written. Answers when checked, or while `checking` after a few seconds.',
});

export const putClaimFile = defineEndpoint({
  ...sent,
  path: '/api/branches/:branch/claims/file',
  summary: 'Send a CSV of claims (multipart, one part `file`): read and previewed.',
});

export const listImports = defineEndpoint({
  ...imports,
  method: 'get',
  path: '/api/branches/:branch/imports',
  summary: 'Files sent for the branch, the newest first; without previews.',
  params: branchParams,
  body: null,
  out: z.strictObject({
    items: z.array(
      importedFile.omit({ preview: true, refusedPreview: true, columns: true, options: true }),
    ),
  }),
  statuses: [200],
});

export const getImport = defineEndpoint({
  ...imports,
  method: 'get',
  path: '/api/branches/:branch/imports/:id',
  summary: 'One file: its preview, or how far it has got.',
  params,
  body: null,
  out: importedFile,
  statuses: [200],
});

/** 409 once it is being written. */
export const changeImport = defineEndpoint({
  ...imports,
  method: 'put',
  path: '/api/branches/:branch/imports/:id',
  summary:
    'Say how the file is to be read and which column fills which field; checks it anew and remembers the columns for the branch.',
  params,
  body: z.strictObject({
    options: readingOptions,
    columns: z.array(
      z.strictObject({ index: z.int().min(0), field: z.string().max(64).nullable() }),
    ),
  }),
  out: importedFile,
  statuses: [200],
});

/** 409 unless it is `ready`, or ended before its end: then it goes on with what is missing. */
export const confirmImport = defineEndpoint({
  ...imports,
  method: 'post',
  path: '/api/branches/:branch/imports/:id/confirm',
  summary: 'Write the good rows of a file that was previewed.',
  params,
  body: null,
  out: importedFile,
  statuses: [202],
});

export const cancelImport = defineEndpoint({
  ...imports,
  method: 'post',
  path: '/api/branches/:branch/imports/:id/cancel',
  summary: 'Stop checking or writing a file; what is written stays.',
  params,
  body: null,
  out: importedFile,
  statuses: [200],
});

export const getRefusedRows = defineEndpoint({
  ...imports,
  method: 'get',
  path: '/api/branches/:branch/imports/:id/refused.csv',
  summary:
    'The refused rows as they were sent, each with its reason in a last column: to mend and send again.',
  params,
  body: null,
  out: 'csv',
  statuses: [200],
});
