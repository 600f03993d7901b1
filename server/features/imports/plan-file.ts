import { readImportCatalogue, rememberedColumns } from '#db/queries/imports';
import type { ImportRecord } from '#db/queries/import-row';
import type { ScopedDb } from '#db/scoped-db';
import type { ImportKind, ReadingOptions } from '#shared/contracts/imports';
import { importFields } from '#shared/domain/import-fields';
import { FileProblem } from './file-problem';
import { guessReading, headRows } from './guess-reading';
import type { InspectedFile } from './inspect-file';
import { planColumns } from './plan-columns';

/** A file as it is before its check. */
export type PlannedFile = Pick<
  ImportRecord,
  | 'options'
  | 'columns'
  | 'state'
  | 'problem'
  | 'endedAt'
  | 'counts'
  | 'preview'
  | 'refusedPreview'
  | 'rowsDone'
  | 'rowsOf'
  | 'written'
>;

const UNREAD = {
  counts: { rows: 0, new: 0, changed: 0, unchanged: 0, refused: 0 },
  preview: [],
  refusedPreview: [],
  rowsDone: 0,
  rowsOf: null,
  written: { created: 0, replaced: 0, unchanged: 0, refused: 0 },
};

/** How a file is read and what its columns mean, guessed where nobody has said so; or why it cannot be read (`failed`). */
export async function planFile(
  db: ScopedDb,
  { branch, kind, at }: { branch: string; kind: ImportKind; at: string },
  inspected: InspectedFile,
  said?: ReadingOptions,
): Promise<PlannedFile> {
  const fields = importFields(kind, readImportCatalogue(db));
  const options = said ?? (await guessReading(inspected, fields));
  const rows = await headRows({ ...inspected, encoding: options.encoding }, options.delimiter);
  try {
    if (rows.length === 0) throw new FileProblem('No row of headings can be read in this file.');
    const columns = planColumns(rows, fields, rememberedColumns(db, branch, kind));
    return { ...UNREAD, options, columns, state: 'checking', problem: null, endedAt: null };
  } catch (error) {
    if (!(error instanceof FileProblem)) throw error;
    const { message } = error;
    return { ...UNREAD, options, columns: [], state: 'failed', problem: message, endedAt: at };
  }
}
