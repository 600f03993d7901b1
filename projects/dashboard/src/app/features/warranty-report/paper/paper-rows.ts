/** One column of a table on paper. */
export interface PaperColumn {
  readonly label: string;
  /** Numbers stand right in tabular figures, words left. */
  readonly kind: 'words' | 'number';
}

/** A table of the report as it is printed: words only, in the order in which they are read. */
export interface PaperRows {
  readonly columns: readonly PaperColumn[];
  readonly rows: readonly (readonly string[])[];
  readonly total?: readonly string[];
}

/** A column of words. */
export function words(label: string): PaperColumn {
  return { label, kind: 'words' };
}

/** A column of numbers. */
export function number(label: string): PaperColumn {
  return { label, kind: 'number' };
}
