import type {
  ImportColumn,
  ImportedFile,
  ImportKind,
  PreviewRow,
  ReadingOptions,
} from '#shared/contracts/imports';

/** A file as it is kept, its lists parsed. */
export interface ImportRecord {
  id: string;
  branchId: number;
  kind: ImportKind;
  fileName: string;
  storedFile: string;
  bytes: number;
  sha256: string;
  receivedAt: string;
  personId: number;
  state: ImportedFile['state'];
  options: ReadingOptions;
  columns: ImportColumn[];
  counts: ImportedFile['counts'];
  preview: PreviewRow[];
  refusedPreview: PreviewRow[];
  /** Rows passed by the writing, refused ones among them. */
  rowsDone: number;
  /** Rows below the headings; null until a check has come to its end. */
  rowsOf: number | null;
  written: ImportedFile['written'];
  endedAt: string | null;
  problem: string | null;
}

/** What changes of it. */
export type ImportChange = Partial<
  Omit<ImportRecord, 'id' | 'branchId' | 'kind' | 'fileName' | 'storedFile' | 'bytes' | 'sha256'>
>;

/** Columns by field. */
export const IMPORT_COLUMNS: Readonly<Record<keyof ImportRecord, string>> = {
  id: 'id',
  branchId: 'branch_id',
  kind: 'kind',
  fileName: 'file_name',
  storedFile: 'stored_file',
  bytes: 'bytes',
  sha256: 'sha256',
  receivedAt: 'received_at',
  personId: 'person_id',
  state: 'state',
  options: 'options',
  columns: 'columns',
  counts: 'counts',
  preview: 'preview',
  refusedPreview: 'refused_preview',
  rowsDone: 'rows_done',
  rowsOf: 'rows_of',
  written: 'written',
  endedAt: 'ended_at',
  problem: 'problem',
};

const LISTS = ['options', 'columns', 'counts', 'preview', 'refusedPreview', 'written'] as const;

/** A record as a row, its lists as text. */
export function rowOfImport(change: Partial<ImportRecord>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(change).map(([field, value]) => [
      IMPORT_COLUMNS[field as keyof ImportRecord],
      typeof value === 'object' && value !== null ? JSON.stringify(value) : value,
    ]),
  );
}

/** A row whose columns were named as the record's fields, parsed. */
export function importOfRow<Row extends object>(row: Row): Row {
  const parsed = { ...row } as Record<string, unknown>;
  for (const list of LISTS) {
    const text = parsed[list];
    if (typeof text === 'string') parsed[list] = JSON.parse(text) as unknown;
  }
  return parsed as unknown as Row;
}
