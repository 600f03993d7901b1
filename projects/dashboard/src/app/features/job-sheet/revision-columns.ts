import type { JobSheet } from '#shared/contracts/jobs';
import type { Column } from '../../ui/data-table/column';
import { formatInstant } from '../../ui/format';
import { SOURCE_NAMES } from '../../ui/words';

type Revision = JobSheet['revisions'][number];

const CHANGES: Readonly<Record<Revision['change'], string>> = {
  created: 'sent',
  replaced: 'corrected',
  restored: 'brought back',
};

/** Every revision of a job: what happened, when, by whom, from where. */
export const REVISION_COLUMNS: readonly Column<Revision>[] = [
  { key: 'revision', label: 'Revision', text: (row) => String(row.revision) },
  { key: 'change', label: 'What', text: (row) => CHANGES[row.change] },
  { key: 'when', label: 'When', text: (row) => formatInstant(row.receivedAt) },
  { key: 'by', label: 'By', text: (row) => row.by },
  { key: 'source', label: 'From', text: (row) => SOURCE_NAMES[row.source] },
];
