import type { ImportField } from '#shared/domain/import-field';

/** Fields under a heading of the list to choose from. */
export interface FieldGroup {
  readonly name: string;
  readonly fields: readonly ImportField[];
}

const NEEDED = 'needed';
/** What the first word of a field's name belongs to; whatever is not named here is about the car and its days. */
const GROUPS: Readonly<Record<string, string>> = {
  estimate: 'estimate',
  actual: 'minutes worked',
  product: 'product',
  ml: 'product',
  consumables: 'consumables and bought-in work',
  boughtIn: 'consumables and bought-in work',
  boughtInCents: 'consumables and bought-in work',
  checks: 'checks and workshop',
  workshop: 'checks and workshop',
  invoice: 'bill and notes',
  notes: 'bill and notes',
  finding: 'findings',
};

/** Fields to choose from: those that a row cannot do without first, the others by what they belong to. */
export function fieldGroups(
  kind: 'jobs' | 'claims',
  fields: readonly ImportField[],
): readonly FieldGroup[] {
  const rest = kind === 'jobs' ? 'car and days' : 'more';
  const groups = new Map<string, ImportField[]>([[NEEDED, []]]);
  for (const field of fields) {
    const word = /^[a-zA-Z]+/.exec(field.field)?.[0] ?? '';
    const name = field.required ? NEEDED : kind === 'jobs' ? (GROUPS[word] ?? rest) : rest;
    groups.set(name, [...(groups.get(name) ?? []), field]);
  }
  return [...groups].map(([name, of]) => ({ name, fields: of }));
}
