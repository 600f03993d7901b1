import type { Problem } from '../../core/api/problem';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import type { TypedProblems } from './typed-claim';

const FIELDS: Readonly<
  Record<string, { readonly field: keyof TypedClaim; readonly name: string }>
> = {
  '/claimRef': { field: 'claimRef', name: 'The reference' },
  '/madeOn': { field: 'madeOn', name: 'The day it was made' },
  '/zone': { field: 'zone', name: 'The place' },
  '/side': { field: 'zone', name: 'The side' },
  '/cause': { field: 'cause', name: 'The cause' },
  '/labourMinutes': { field: 'labourMinutes', name: 'The labour' },
  '/productMl': { field: 'productMl', name: 'The product' },
  '/costCents': { field: 'cost', name: 'The cost' },
  '/decision': { field: 'decision', name: 'The decision' },
  '/decidedOn': { field: 'decidedOn', name: 'The day it was decided' },
  '/paidOn': { field: 'paidOn', name: 'The day it was paid' },
  '/note': { field: 'note', name: 'The note' },
};

const IN_MESSAGES: readonly (readonly [RegExp, string])[] = [
  [/\bmadeOn\b/g, 'the day it was made'],
  [/\bcompletedOn\b/g, 'the day the job was finished'],
  [/\bdecidedOn\b/g, 'the day it was decided'],
];

/** What the server refused, field by field and in the form's own words. */
export function fieldProblems(problem: Problem): TypedProblems {
  const found: TypedProblems = {};
  for (const { path, message } of problem.fields) {
    const known = FIELDS[path];
    if (known) found[known.field] ??= sentence(known.name, message);
  }
  return found;
}

/** A message that goes on from its field's name is read after it, any other by itself. */
function sentence(name: string, message: string): string {
  const said = IN_MESSAGES.reduce((text, [code, words]) => text.replace(code, words), message);
  const goesOn = /^(is|are|has|have|lies|must|cannot)\b/.test(said);
  const words = goesOn ? `${name} ${said}` : `${said.charAt(0).toUpperCase()}${said.slice(1)}`;
  return words.endsWith('.') ? words : `${words}.`;
}
