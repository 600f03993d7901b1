import { Refusal } from './refusal';

/** The conditional headers of a write (RFC 9110, 13.1). */
export interface Preconditions {
  ifMatch: string | undefined;
  ifNoneMatch: string | undefined;
  /** Says who changed the job last and when, for the refusal. */
  lastChange: () => string;
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
    throw new Refusal('precondition', `There already is one: ${lastChange()}.`);
  }
  if (ifMatch !== undefined && !matches(ifMatch, present)) {
    throw new Refusal(
      'precondition',
      present === undefined
        ? 'It is not there any more; read it again before changing it.'
        : `It was changed meanwhile: ${lastChange()}. Read it again; what you typed is not lost.`,
    );
  }
}

function matches(header: string, present: string | undefined): boolean {
  if (present === undefined) return false;
  const tags = header.split(',').map((tag) => tag.trim());
  return tags.includes('*') || tags.includes(present);
}
