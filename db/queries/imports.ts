import type { ImportKind } from '#shared/contracts/imports';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { IMPORT_COLUMNS, importOfRow, type ImportRecord } from './import-row';

/** A file with its branch's code and the name of who sent it. */
export type SentImport = ImportRecord & { branch: string; by: string };
/** The same without what is long. */
export type ListedImport = Omit<SentImport, 'options' | 'columns' | 'preview' | 'refusedPreview'>;

/** A file of a branch, or `undefined`. */
export function findImport(db: ScopedDb, branch: string, id: string): SentImport | undefined {
  const row = db.first<SentImport>(
    filesOf(db, branch)
      .where('imports.id', id)
      .select(named(Object.keys(IMPORT_COLUMNS))),
  );
  return row && importOfRow(row);
}

/** The files of a branch, the newest first. */
export function listImports(db: ScopedDb, branch: string, limit: number): ListedImport[] {
  const long = ['options', 'columns', 'preview', 'refusedPreview'];
  const fields = Object.keys(IMPORT_COLUMNS).filter((field) => !long.includes(field));
  return db
    .all<ListedImport>(
      filesOf(db, branch)
        .orderBy([
          { column: 'imports.received_at', order: 'desc' },
          { column: 'imports.id', order: 'desc' },
        ])
        .limit(limit)
        .select(named(fields)),
    )
    .map(importOfRow);
}

/** What headings mean to a branch, as a person last said it. */
export function rememberedColumns(
  db: ScopedDb,
  branch: string,
  kind: ImportKind,
): Map<string, string | null> {
  const rows = db.all<{ key: string; field: string | null }>(
    db
      .table('import_columns')
      .join('branches', 'branches.id', 'import_columns.branch_id')
      .where({ 'branches.code': branch, kind })
      .select({ key: 'heading_key' }, 'field'),
  );
  return new Map(rows.map(({ key, field }) => [key, field]));
}

/** The catalogue as the columns and cells of a file need it. */
export function readImportCatalogue(db: ScopedDb): {
  products: { code: string; name: string }[];
  packages: { code: string; name: string }[];
} {
  return {
    products: db.all(sql('products').orderBy('code').select('code', 'name')),
    packages: db.all(sql('packages').orderBy('code').select('code', 'name')),
  };
}

function filesOf(db: ScopedDb, branch: string): ReturnType<ScopedDb['table']> {
  return db
    .table('imports')
    .join('branches', 'branches.id', 'imports.branch_id')
    .join('people', 'people.id', 'imports.person_id')
    .where('branches.code', branch)
    .select({ branch: 'branches.code', by: 'people.name' });
}

function named(fields: readonly string[]): Record<string, string> {
  return Object.fromEntries(
    fields.map((field) => [field, `imports.${IMPORT_COLUMNS[field as keyof ImportRecord]}`]),
  );
}
