import type { ImportedFile } from '#shared/contracts/imports';
import { importFields, type ImportCatalogue } from '#shared/domain/import-fields';
import type { ListedImport, SentImport } from '#db/queries/imports';
import type { Counts } from './check-file';
import { missingFields } from './plan-columns';

/** What of a file is known only while it is worked on. */
export interface LiveProgress {
  done: number;
  of: number | null;
  /** Of the check so far. */
  counts?: Counts;
}

type Listed = Omit<ImportedFile, 'preview' | 'refusedPreview' | 'columns' | 'options'>;

/** A file as it is answered, with its columns and previews. */
export function tellImport(
  record: SentImport,
  catalogue: ImportCatalogue,
  live: LiveProgress | undefined,
): ImportedFile {
  const fields = importFields(record.kind, catalogue);
  return {
    ...tellListed(record, live),
    options: record.options,
    columns: record.columns,
    missingFields: missingFields(record.columns, fields),
    preview: record.preview,
    refusedPreview: record.refusedPreview,
  };
}

/** A file as a list of files shows it. */
export function tellListed(record: ListedImport, live: LiveProgress | undefined): Listed {
  const checking = record.state === 'checking';
  return {
    id: record.id,
    branch: record.branch,
    kind: record.kind,
    fileName: record.fileName,
    bytes: record.bytes,
    receivedAt: record.receivedAt,
    by: record.by,
    state: record.state,
    missingFields: [],
    counts: (checking ? live?.counts : undefined) ?? record.counts,
    progress: progressOf(record, checking ? live : undefined),
    written: record.written,
    endedAt: record.endedAt,
    problem: record.problem,
  };
}

/** Of the check until it is complete, of the writing from then on. */
function progressOf(
  { state, rowsDone, rowsOf, counts }: ListedImport,
  live: LiveProgress | undefined,
): ImportedFile['progress'] {
  if (live) return { done: live.done, of: live.of };
  if (state === 'ready') return { done: counts.rows, of: rowsOf };
  return { done: rowsDone, of: rowsOf };
}
