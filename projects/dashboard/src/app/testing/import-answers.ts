import type { ImportedFile } from '#shared/contracts/imports';

/** A file of jobs as the server tells it: two columns, three rows, one of them refused; changed by what a spec is about. */
export function importedFile(change: Partial<ImportedFile> = {}): ImportedFile {
  return {
    id: 'f1',
    branch: 'HAV',
    kind: 'jobs',
    fileName: 'winter.csv',
    bytes: 5200,
    receivedAt: '2026-02-02T06:00:00Z',
    by: 'Ilse Torven',
    state: 'ready',
    options: { delimiter: ';', encoding: 'windows-1252', decimal: ',', dateOrder: 'dmy' },
    columns: [
      { index: 0, heading: 'Job', field: 'jobRef', chosen: false, examples: ['W1', 'W2'] },
      { index: 1, heading: 'Colour', field: null, chosen: false, examples: ['blue'] },
      { index: 2, heading: 'Done', field: 'completedOn', chosen: true, examples: ['28.01.2026'] },
    ],
    missingFields: [],
    counts: { rows: 1204, new: 1150, changed: 31, unchanged: 12, refused: 11 },
    preview: [
      { line: 2, ref: 'W1', status: 'new', values: ['W1', 'blue', '28.01.2026'], problems: [] },
      {
        line: 3,
        ref: 'W2',
        status: 'refused',
        values: ['W2', 'red', '31.02.2026'],
        problems: [
          { heading: 'Done', message: 'is not a day' },
          { heading: null, message: 'has no model' },
        ],
      },
    ],
    refusedPreview: [
      {
        line: 3,
        ref: 'W2',
        status: 'refused',
        values: ['W2', 'red', '31.02.2026'],
        problems: [
          { heading: 'Done', message: 'is not a day' },
          { heading: null, message: 'has no model' },
        ],
      },
    ],
    progress: { done: 1204, of: 1204 },
    written: { created: 0, replaced: 0, unchanged: 0, refused: 0 },
    endedAt: null,
    problem: null,
    ...change,
  };
}
