import type { RecordedClaim } from '#db/claim-writer';
import type { ReadRow } from './read-row';
import { RowBody } from './row-body';

/** The claim that a row says: its cells where the file has a column, everything else as it is stored. */
export function bodyOfClaim(row: ReadRow, stored: RecordedClaim | undefined): RowBody {
  const draft = new RowBody(row, stored);
  draft.fill(
    'jobRef',
    'madeOn',
    'zone',
    'side',
    'cause',
    'decision',
    'decidedOn',
    'labourMinutes',
    'productMl',
    'costCents',
    'paidOn',
    'note',
  );
  return draft;
}
