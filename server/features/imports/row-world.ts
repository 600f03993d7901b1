import type { ClaimSending } from '#db/accept-claim';
import type { ImportColumn, ImportKind, ReadingOptions } from '#shared/contracts/imports';
import { importFields, type ImportCatalogue } from '#shared/domain/import-fields';
import type { ImportField } from '#shared/domain/import-field';
import type { JobWorld } from '#shared/domain/job-rules';
import type { CellReading } from './read-cell';
import { filledColumns } from './plan-columns';
import type { FilledColumn } from './read-row';

/** A file as it is to be read: plain data, so that it crosses into the thread that reads it. */
export interface FileQuestion {
  kind: ImportKind;
  path: string;
  options: ReadingOptions;
  columns: readonly ImportColumn[];
  /** The branch's local date. */
  today: string;
  /** Who sends it, for what they may decide of claims (rule 77). */
  sender: Pick<ClaimSending, 'role' | 'limitCents'>;
}

/** Everything that a row is read and judged by. */
export interface RowWorld {
  kind: ImportKind;
  /** How many headings there are. */
  width: number;
  fields: readonly ImportField[];
  columns: readonly FilledColumn[];
  reading: CellReading;
  job: JobWorld;
  sender: FileQuestion['sender'];
}

/** The world of a file's rows, from how it is read and the catalogue as it is. */
export function worldOfRows(question: FileQuestion, catalogue: ImportCatalogue): RowWorld {
  const { kind, options, columns, today, sender } = question;
  const fields = importFields(kind, catalogue);
  const products = new Set(catalogue.products.map(({ code }) => code));
  const packages = new Set(catalogue.packages.map(({ code }) => code));
  return {
    kind,
    width: columns.length,
    fields,
    columns: filledColumns(columns, fields),
    reading: { options, today, packages: catalogue.packages },
    job: {
      today,
      isProduct: (code) => products.has(code),
      isPackage: (code) => packages.has(code),
    },
    sender,
  };
}
