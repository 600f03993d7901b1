import type { ImportColumn, ImportedFile, ReadingOptions } from '#shared/contracts/imports';
import type { ImportField } from '#shared/domain/import-field';

/** How a file is to be read, as it stands in the form; sent only when the file is checked again. */
export interface ReadingDraft {
  readonly options: ReadingOptions;
  readonly columns: readonly { readonly index: number; readonly field: string | null }[];
}

/** As the file was read last. */
export function draftOf({
  options,
  columns,
}: Pick<ImportedFile, 'options' | 'columns'>): ReadingDraft {
  return { options, columns: columns.map(({ index, field }) => ({ index, field })) };
}

/** Whether the form says something else than how the file was read. */
export function isChanged(
  draft: ReadingDraft,
  file: Pick<ImportedFile, 'options' | 'columns'>,
): boolean {
  return JSON.stringify(draft) !== JSON.stringify(draftOf(file));
}

/** Lets a column fill a field, or nothing; another column that filled the same is left out, since two cannot. */
export function chooseField(
  draft: ReadingDraft,
  index: number,
  field: string | null,
  fields: readonly ImportField[],
): ReadingDraft {
  const fillsOf = (name: string | null): string | undefined =>
    fields.find((one) => one.field === name)?.fills;
  const wanted = fillsOf(field);
  return {
    ...draft,
    columns: draft.columns.map((column) => {
      if (column.index === index) return { index, field };
      const clashes = wanted !== undefined && fillsOf(column.field) === wanted;
      return clashes ? { ...column, field: null } : column;
    }),
  };
}

/** How a column came to its field, in words. */
export function matchWords(column: ImportColumn, field: string | null): string {
  if (field !== column.field) return field === null ? 'left out just now' : 'chosen just now';
  if (column.chosen) return 'as chosen for this branch before';
  return field === null ? 'no field has this name' : 'by its name';
}
