import { CLAIM_FIELDS } from './import-fields-of-claims';
import { jobFields } from './import-fields-of-jobs';
import { headingKey, type ImportField } from './import-field';

/** What the fields need of the catalogue. */
export interface ImportCatalogue {
  products: readonly { code: string; name: string }[];
  packages: readonly { code: string; name: string }[];
}

/** Everything that a column of a file may fill. */
export function importFields(kind: 'jobs' | 'claims', catalogue: ImportCatalogue): ImportField[] {
  return kind === 'jobs' ? jobFields(catalogue) : [...CLAIM_FIELDS];
}

/** Which field each heading means, by name alone; of two columns for the same thing the first counts. */
export function matchHeadings(
  headings: readonly string[],
  fields: readonly ImportField[],
): (ImportField | undefined)[] {
  const known = new Map<string, ImportField>();
  // The field's own name before its label before other names, whichever field stands first.
  for (const namesOf of [
    (field: ImportField) => [field.field],
    (field: ImportField) => [field.label],
    (field: ImportField) => field.names,
  ]) {
    for (const field of fields) {
      for (const name of namesOf(field)) {
        const key = headingKey(name);
        if (!known.has(key)) known.set(key, field);
      }
    }
  }
  const filled = new Set<string>();
  return headings.map((heading) => {
    const field = known.get(headingKey(heading));
    if (!field || filled.has(field.fills)) return undefined;
    filled.add(field.fills);
    return field;
  });
}
