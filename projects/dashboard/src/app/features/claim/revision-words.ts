import type { getClaimHistory } from '#shared/contracts/claim-list';
import type { OutOf } from '#shared/contracts/endpoint';
import { formatInstant } from '../../ui/format';
import { SOURCE_NAMES } from '../../ui/words';

type Revision = OutOf<typeof getClaimHistory>['items'][number];

const CHANGES: Readonly<Record<Revision['change'], string>> = {
  created: 'Recorded',
  replaced: 'Changed',
  restored: 'Brought back',
};

/** A revision of a claim in a sentence: "Changed by Runa Felde, 2 Feb 2026, 07:31." */
export function claimRevisionWords({
  change,
  by,
  receivedAt,
  source,
}: Pick<Revision, 'change' | 'by' | 'receivedAt' | 'source'>): string {
  const words = `${CHANGES[change]} by ${by}, ${formatInstant(receivedAt)}`;
  // A name says that a person sent it, and which key.
  return source === 'file' ? `${words}; it came from ${SOURCE_NAMES[source]}.` : `${words}.`;
}
