import { CLAIM_CAUSES, CLAIM_DECISIONS, SIDES, ZONES } from '#shared/domain/vocabulary';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { formatDate } from '../../ui/format';
import { CLAIM_CAUSE_NAMES, CLAIM_DECISION_NAMES, SIDE_NAMES, ZONE_NAMES } from '../../ui/words';

/** A field that the record and the form say differently. */
export interface Difference {
  readonly field: string;
  readonly record: string;
  readonly form: string;
}

const FIELDS: readonly (readonly [keyof TypedClaim, string])[] = [
  ['madeOn', 'Made on'],
  ['zone', 'Zone'],
  ['side', 'Side'],
  ['cause', 'Why rust came back'],
  ['labourMinutes', 'Labour, minutes'],
  ['productMl', 'Product, ml'],
  ['cost', 'Cost before tax'],
  ['decision', 'Decision'],
  ['decidedOn', 'Decided on'],
  ['paidOn', 'Paid on'],
  ['note', 'Note'],
];

/** Where the claim on record and what was typed part, so that nobody writes over another unseen. */
export function differencesOf(record: TypedClaim, typed: TypedClaim): readonly Difference[] {
  return FIELDS.filter(([name]) => record[name].trim() !== typed[name].trim()).map(
    ([name, field]) => ({
      field,
      record: wordsOf(name, record[name]),
      form: wordsOf(name, typed[name]),
    }),
  );
}

function wordsOf(name: keyof TypedClaim, value: string): string {
  if (value.trim() === '') return 'nothing';
  switch (name) {
    case 'madeOn':
    case 'decidedOn':
    case 'paidOn':
      return formatDate(value);
    case 'zone':
      return named(ZONES, ZONE_NAMES, value);
    case 'side':
      return named(SIDES, SIDE_NAMES, value);
    case 'cause':
      return named(CLAIM_CAUSES, CLAIM_CAUSE_NAMES, value);
    case 'decision':
      return named(CLAIM_DECISIONS, CLAIM_DECISION_NAMES, value);
    default:
      return value;
  }
}

function named<Code extends string>(
  codes: readonly Code[],
  names: Readonly<Record<Code, string>>,
  value: string,
): string {
  const code = codes.find((one) => one === value);
  return code === undefined ? value : names[code];
}
