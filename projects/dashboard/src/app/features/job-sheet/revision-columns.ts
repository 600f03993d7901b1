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

/** Every revision of a job: what happened, when, by whom, from where; the third column opens what it changed, in view on a phone too. */
export const REVISION_COLUMNS: readonly Column<Revision>[] = [
  { key: 'revision', label: 'Revision', text: (row) => String(row.revision) },
  { key: 'change', label: 'What', text: (row) => CHANGES[row.change] },
  { key: 'changes', label: 'Changes', unseenLabel: true, text: () => '' },
  { key: 'when', label: 'When', text: (row) => formatInstant(row.receivedAt) },
  { key: 'by', label: 'By', text: (row) => row.by },
  { key: 'source', label: 'From', text: (row) => SOURCE_NAMES[row.source] },
];

/** A revision in a sentence: "Corrected by Runa Felde, 2 Feb 2026, 07:31; it came from the form." */
export function revisionWords({ change, by, receivedAt, source }: Revision): string {
  const what = CHANGES[change];
  const words = `${what.charAt(0).toUpperCase()}${what.slice(1)} by ${by}, ${formatInstant(receivedAt)}`;
  // That a person sent it is said by their name.
  return source === 'person' ? `${words}.` : `${words}; it came from ${SOURCE_NAMES[source]}.`;
}
