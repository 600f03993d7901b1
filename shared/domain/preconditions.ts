import { Refusal } from './refusal';

/** The conditional headers of a write (RFC 9110, 13.1). */
export interface Preconditions {
  ifMatch: string | undefined;
  ifNoneMatch: string | undefined;
  /** Says who changed it last and when, for the refusal; `undefined` when it was never there. */
  lastChange: () => string | undefined;
}

/** Who sent a revision and when. */
export interface SentRevision {
  revision: number;
  receivedAt: string;
  personName: string | null;
  keyLabel: string | null;
}

/** Who sent a revision, by name. */
export function senderOf({
  personName,
  keyLabel,
}: Pick<SentRevision, 'personName' | 'keyLabel'>): string {
  if (personName !== null) return personName;
  return keyLabel !== null ? `push key "${keyLabel}"` : 'the system';
}

/** A revision in words, as a refusal names it. */
export function tellRevision(sent: SentRevision): string {
  return `revision ${sent.revision} by ${senderOf(sent)} at ${sent.receivedAt}`;
}

/** The entity tag of a revision. */
export function tagOf(revision: number): string {
  return `"r${revision}"`;
}

/** Refuses a write whose writer has not seen the present state (rule 73). A voided job has no present state. */
export function checkPreconditions(
  { ifMatch, ifNoneMatch, lastChange }: Preconditions,
  stored: { revision: number; voided: boolean } | undefined,
): void {
  const present = stored && !stored.voided ? tagOf(stored.revision) : undefined;
  if (ifNoneMatch !== undefined && matches(ifNoneMatch, present)) {
    throw new Refusal('precondition', `There already is one: ${lastChange() ?? 'just made'}.`);
  }
  if (ifMatch !== undefined && !matches(ifMatch, present)) {
    const change = lastChange();
    throw new Refusal(
      'precondition',
      present === undefined
        ? `It is not there${change === undefined ? '' : ` any more: ${change}`}. Read it again before changing it.`
        : `It was changed meanwhile: ${change ?? 'just now'}. Read it again; what you typed is not lost.`,
    );
  }
}

function matches(header: string, present: string | undefined): boolean {
  if (present === undefined) return false;
  const tags = header.split(',').map((tag) => tag.trim());
  return tags.includes('*') || tags.includes(present);
}
